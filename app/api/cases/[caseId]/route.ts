import { answerRoute } from '@/server/http/answer-route';
import { readId } from '@/server/http/read-id';

export function GET(request: Request, { params }: { params: Promise<{ caseId: string }> }): Promise<Response> {
  return answerRoute(request, async (source) => globalThis.fascicle.query('case-head', { caseId: readId((await params).caseId) }, source));
}
