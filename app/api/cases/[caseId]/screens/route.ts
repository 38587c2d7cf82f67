import { pairScreenRequestSchema } from '@/lib/contracts/http/replies';
import { answerRoute } from '@/server/http/answer-route';
import { readId } from '@/server/http/read-id';
import { readJson } from '@/server/http/read-json';

type Place = { params: Promise<{ caseId: string }> };

export function GET(request: Request, { params }: Place): Promise<Response> {
  return answerRoute(request, async (source) => globalThis.fascicle.query('screens', { caseId: readId((await params).caseId) }, source));
}

export function POST(request: Request, { params }: Place): Promise<Response> {
  return answerRoute(request, async (source) => {
    const caseId = readId((await params).caseId);
    return globalThis.fascicle.execute('pair-screen', { caseId, request: await readJson(request, pairScreenRequestSchema) }, source);
  });
}
