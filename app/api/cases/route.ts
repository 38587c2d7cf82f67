import { planCaseRequestSchema } from '@/lib/contracts/http/commands';
import { answerRoute } from '@/server/http/answer-route';
import { readJson } from '@/server/http/read-json';

export function GET(request: Request): Promise<Response> {
  return answerRoute(request, (source) => globalThis.fascicle.query('cases', {}, source));
}

export function POST(request: Request): Promise<Response> {
  return answerRoute(request, async (source) => globalThis.fascicle.execute('plan-case', await readJson(request, planCaseRequestSchema), source));
}
