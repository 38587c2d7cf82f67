import { answerRoute } from '@/server/http/answer-route';
import { readId } from '@/server/http/read-id';

export function DELETE(request: Request, { params }: { params: Promise<{ caseId: string; screenId: string }> }): Promise<Response> {
  return answerRoute(request, async (source) => {
    const { caseId, screenId } = await params;
    return globalThis.fascicle.execute('revoke-screen', { caseId: readId(caseId), screenId: readId(screenId) }, source);
  });
}
