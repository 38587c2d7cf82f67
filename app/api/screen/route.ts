import { answerRoute } from '@/server/http/answer-route';

export function GET(request: Request): Promise<Response> {
  return answerRoute(request, (source) => globalThis.fascicle.query('screen', {}, source));
}

export function POST(request: Request): Promise<Response> {
  return answerRoute(request, (source) => globalThis.fascicle.execute('ask-for-screen', {}, source));
}
