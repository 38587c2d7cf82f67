import type { SignedIn } from '@/server/auth/read-session';
import { openCase } from '@/server/queries/open-case';
import type { ServerContext } from '@/server/server-context';

/**
 * Whether a page of a case may be sent. The page holds nothing of the case, so nothing is read and only a refusal is
 * noted: what the page then asks for is the read.
 */
export async function caseAccess(context: Pick<ServerContext, 'database' | 'memory'>, { actor }: SignedIn, caseId: string): Promise<{ readonly caseId: string }> {
  await openCase(context, actor, { caseId, action: 'see-case', what: null });
  return { caseId };
}
