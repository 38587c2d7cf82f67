import { answerRoute } from '@/server/http/answer-route';

export function GET(request: Request): Promise<Response> {
  return answerRoute(request, (source) => globalThis.fascicle.query('people', {}, source));
}
