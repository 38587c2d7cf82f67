import { apiLimits } from '@/lib/contracts/http/api-limits';
import { answerRoute } from '@/server/http/answer-route';
import { readCount } from '@/server/http/read-count';
import { readId } from '@/server/http/read-id';

export function GET(request: Request, { params }: { params: Promise<{ caseId: string }> }): Promise<Response> {
  return answerRoute(request, async (source) => {
    const caseId = readId((await params).caseId);
    const after = readCount(request, 'after', { min: 0, max: Number.MAX_SAFE_INTEGER, fallback: 0 });
    const limit = readCount(request, 'limit', { min: 1, max: apiLimits.pageEntries, fallback: apiLimits.pageEntries });
    return globalThis.fascicle.query('case-entries', { caseId, after, limit }, source);
  });
}
