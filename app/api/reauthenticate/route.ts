import { answerRoute } from '@/server/http/answer-route';
import { readJson } from '@/server/http/read-json';
import { secretsTyped } from '@/server/http/secrets-typed';

export function POST(request: Request): Promise<Response> {
  return answerRoute(request, async (source) => globalThis.fascicle.execute('reauthenticate', await readJson(request, secretsTyped), source));
}
