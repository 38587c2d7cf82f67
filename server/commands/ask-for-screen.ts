import { v7 as newId } from 'uuid';

import { askPairing } from '@/db/repositories/screens/ask-pairing';
import { newPairingCode, newPairingWords } from '@/server/auth/pairing-words';
import { newScreenToken, screenCookie, screenTokenHash } from '@/server/auth/screen-token';
import { failure, notSaved } from '@/server/failure';
import { screenStatus } from '@/server/queries/screen-status';
import type { ScreenReply } from '@/lib/contracts/http/replies';
import type { ServerContext } from '@/server/server-context';
import type { RateLimit } from '@/server/auth/rate-limit';

/** A wall's answer with the cookie it is to keep, null when it keeps the one it has. */
export interface AskedScreen {
  readonly reply: ScreenReply;
  readonly cookie: string | null;
}

const mostDraws = 5;

/** A wall asks to be paired. One that waits or is paired keeps what it has; another gets token, code and two words. */
export async function askForScreen(context: ServerContext, source: { cookie: string | null; address: string }, limit: RateLimit): Promise<AskedScreen> {
  const present = await screenStatus(context, source.cookie);
  if (present !== null && present.kind !== 'ended') return { reply: present, cookie: null };
  if (!limit.take(source.address)) throw failure('too-many', 'too-many', 'Too many: this machine asked for a pairing code too often. Wait a minute.');
  for (let draw = 0; draw < mostDraws; draw += 1) {
    const asked = { id: newId(), token: newScreenToken(), code: newPairingCode(), words: newPairingWords() };
    try {
      await askPairing(context.database.app, { id: asked.id, tokenHash: screenTokenHash(asked.token), code: asked.code, words: asked.words });
    } catch (cause) {
      if (cause instanceof Error && 'code' in cause && cause.code === '23505') continue;
      throw cause;
    }
    return { reply: { kind: 'waiting', screenId: asked.id, code: asked.code, words: asked.words }, cookie: screenCookie(asked.token, context.publicUrl) };
  }
  throw notSaved();
}
