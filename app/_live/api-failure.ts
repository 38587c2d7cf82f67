import type { FailureReply } from '@/lib/contracts/http/replies';

/** A request that failed, with a sentence for the person who meets it. */
export class ApiFailure extends Error {
  override readonly name = 'ApiFailure';

  constructor(
    readonly kind: FailureReply['kind'] | 'no-link' | 'unreadable',
    readonly code: string,
    message: string,
    readonly field: string | null = null,
  ) {
    super(message);
  }
}
