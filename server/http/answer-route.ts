import { isFailure } from '@/server/failure';
import type { Reply, RequestSource } from '@/server/fascicle-global';
import { addressHeader } from '@/server/http/address-header';

/** Where a request came from, as this server itself noted it. */
export function sourceOf(headers: Pick<Headers, 'get'>): RequestSource {
  return { cookie: headers.get('cookie'), authorization: headers.get('authorization'), address: headers.get(addressHeader) ?? 'unknown' };
}

/** Runs a route and writes its answer. A body that the contract refuses is an answer too. */
export async function answerRoute(request: Request, ask: (source: RequestSource) => Promise<Reply<object>>): Promise<Response> {
  try {
    const { status, body, cookies } = await ask(sourceOf(request.headers));
    const headers = new Headers();
    for (const cookie of cookies) headers.append('set-cookie', cookie);
    return Response.json(body, { status: statusOf(status, body), headers });
  } catch (thrown) {
    if (!isFailure(thrown)) throw thrown;
    return Response.json(thrown.reply, { status: thrown.status });
  }
}

/** A command that the case refuses is answered in the form of a command, with the status of a conflict. */
function statusOf(status: number, body: object): number {
  return status === 200 && 'kind' in body && body.kind === 'refused' ? 409 : status;
}
