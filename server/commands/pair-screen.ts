import { findWaitingScreen } from '@/db/repositories/screens/find-waiting-screen';
import { pairScreen as bindScreen } from '@/db/repositories/screens/pair-screen';
import type { WallScreen } from '@/db/repositories/screens/wall-screen';
import { withinHospitals } from '@/db/within-hospitals';
import type { PairScreenReply, PairScreenRequest } from '@/lib/contracts/http/replies';
import type { RateLimit } from '@/server/auth/rate-limit';
import type { SignedIn } from '@/server/auth/read-session';
import { failure } from '@/server/failure';
import { openCase } from '@/server/queries/open-case';
import { pairingCodeS } from '@/server/queries/screen-status';
import type { ServerContext } from '@/server/server-context';

const noSuchCode = () => failure('refused', 'no-such-code', 'No such code: no wall waits with it. A code is good for 10 min; read it from the wall again.', 'code');

/** Binds a waiting wall to one case: first the two words are compared by people, then it is confirmed. */
export async function pairScreen(
  context: ServerContext,
  { actor, session }: SignedIn,
  asked: { caseId: string; request: PairScreenRequest },
  limit: RateLimit,
): Promise<PairScreenReply> {
  const { row } = await openCase(context, actor, { caseId: asked.caseId, action: 'pair-screen', what: null });
  if (!limit.take(session.personId)) throw failure('too-many', 'too-many', 'Too many: codes were tried too often from this account. Wait a minute.');
  const screen = await withinHospitals(context.database.app, [row.hospitalId], async (transaction): Promise<WallScreen | null> => {
    const waiting = await findWaitingScreen(transaction, asked.request.code, pairingCodeS);
    if (waiting === null || !asked.request.isConfirmed) return waiting;
    const isBound = await bindScreen(transaction, {
      screenId: waiting.id,
      hospitalId: row.hospitalId,
      theatreId: null,
      caseId: asked.caseId,
      pairedBy: session.personId,
    });
    return isBound ? waiting : null;
  });
  if (screen === null) throw noSuchCode();
  return { screenId: screen.id, words: screen.words, isPaired: asked.request.isConfirmed };
}
