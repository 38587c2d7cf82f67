import { commandRequestSchema } from '@/lib/contracts/http/commands';
import { answerRoute } from '@/server/http/answer-route';
import { readId } from '@/server/http/read-id';
import { readJson } from '@/server/http/read-json';

export function POST(request: Request, { params }: { params: Promise<{ caseId: string }> }): Promise<Response> {
  return answerRoute(request, async (source) => {
    const caseId = readId((await params).caseId);
    return globalThis.fascicle.execute('give-command', { caseId, request: await readJson(request, commandRequestSchema) }, source);
  });
}
