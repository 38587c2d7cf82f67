import type { FailureReply } from '@/lib/contracts/http/replies';

const statuses = { 'bad-request': 400, 'not-signed-in': 401, 'not-found': 404, refused: 409, 'too-many': 429, 'not-saved': 503 } as const;

/**
 * An answer that is no success, thrown from anywhere below a door. Recognised by `kind`, never by class: Next bundles its
 * own copies of modules.
 */
export interface Failure extends Error {
  readonly kind: 'failure';
  readonly status: number;
  readonly reply: FailureReply;
}

/** Makes a failure with its sentence. */
export function failure(kind: FailureReply['kind'], code: string, message: string, field: string | null = null): Failure {
  return Object.assign(new Error(message), { kind: 'failure' as const, status: statuses[kind], reply: { kind, code, message, field } });
}

/** Whether something thrown is an answer and not a fault. */
export function isFailure(thrown: unknown): thrown is Failure {
  return thrown instanceof Error && 'kind' in thrown && thrown.kind === 'failure' && 'reply' in thrown;
}

/** A case that is not there and a case that is not theirs: one answer, word for word. */
export const notFound = (): Failure => failure('not-found', 'not-found', 'Not found: there is no such case among yours.');

/** Nobody is signed in, or no longer. */
export const notSignedIn = (): Failure => failure('not-signed-in', 'not-signed-in', 'Not signed in. Sign in again; what waits in this browser is kept.');

/** Database or server met a fault: nothing may be called saved. */
export const notSaved = (): Failure =>
  failure('not-saved', 'not-saved', 'Not saved: the server or its database met a fault. It is safe to send the same again.');

/** Database or server met a fault while something was read. */
export const notReadable = (): Failure => failure('not-saved', 'not-reachable', 'Not read: the server or its database met a fault. Try again.');
