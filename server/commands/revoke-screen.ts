import { revokeScreen as unbindScreen } from '@/db/repositories/screens/revoke-screen';
import { screensOfCase } from '@/db/repositories/screens/screens-of-case';
import { withinHospitals } from '@/db/within-hospitals';
import type { SignedIn } from '@/server/auth/read-session';
import { notFound } from '@/server/failure';
import { openCase } from '@/server/queries/open-case';
import type { ServerContext } from '@/server/server-context';

/** Unbinds a wall of this case for good; its picture ends at once. */
export async function revokeScreen(context: ServerContext, { actor }: SignedIn, asked: { caseId: string; screenId: string }): Promise<void> {
  const { row } = await openCase(context, actor, { caseId: asked.caseId, action: 'revoke-screen', what: null });
  await withinHospitals(context.database.app, [row.hospitalId], async (transaction) => {
    const bound = await screensOfCase(transaction, asked.caseId);
    if (!bound.some((screen) => screen.id === asked.screenId)) throw notFound();
    await unbindScreen(transaction, asked.screenId);
  });
  context.onRevoked({ screenId: asked.screenId }, 'revoked');
}
