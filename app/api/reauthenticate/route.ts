import { reauthenticateRequestSchema } from '@/lib/contracts/http/account';
import { answerRoute } from '@/server/http/answer-route';
import { readJson } from '@/server/http/read-json';

export function POST(request: Request): Promise<Response> {
  return answerRoute(request, async (source) =>
    globalThis.fascicle.execute('reauthenticate', await readJson(request, reauthenticateRequestSchema), source),
  );
}
