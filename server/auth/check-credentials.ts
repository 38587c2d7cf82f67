import { createHash } from 'node:crypto';

import { acceptSecondFactorStep } from '@/db/repositories/people/accept-second-factor-step';
import type { Credentials } from '@/db/repositories/people/credentials';
import { beginAttempt, noteSuccess } from '@/db/repositories/sign-in/begin-attempt';
import { isPasswordRight } from '@/server/auth/is-password-right';
import { stepOfCode } from '@/server/auth/second-factor';
import { failure } from '@/server/failure';
import type { ServerContext } from '@/server/server-context';

/** Failures after which a person, and a machine, must wait, and for how long. House rule. */
export const throttle = { windowS: 300, perAccount: 10, perAddress: 60 } as const;

/** What was typed, where, and whose credentials it is held against (null: nobody has this e-mail). */
export interface CredentialsTyped {
  readonly email: string;
  readonly password: string;
  readonly code: string;
  readonly address: string;
  readonly credentials: Credentials | null;
}

type Facts = Pick<ServerContext, 'database' | 'nowMs'>;

/** Passes only with the right password and an unused right code; each attempt is counted, in all processes together. Unknown and wrong look alike. */
export async function checkCredentials(context: Facts, typed: CredentialsTyped): Promise<Credentials> {
  const { app } = context.database;
  const emailHash = createHash('sha256').update(typed.email.toLowerCase()).digest();
  const { id, byEmail, byAddress } = await beginAttempt(app, { emailHash, address: typed.address }, throttle);
  if (id === null) throw waitSentence(byEmail >= throttle.perAccount ? `${byEmail} failed attempts for this account` : `${byAddress} failed attempts from this machine`);
  const isRight = await isPasswordRight(typed.credentials?.passwordHash ?? null, typed.password);
  const step = typed.credentials === null ? null : await stepOfCode(typed.credentials.secondFactorSecret, typed.code, context.nowMs());
  if (typed.credentials === null || !isRight || step === null) {
    throw failure('not-signed-in', 'wrong-credentials', 'Not accepted: e-mail, password or code is wrong.');
  }
  if (!(await acceptSecondFactorStep(app, typed.credentials.personId, step))) {
    throw failure('not-signed-in', 'code-used', 'Not accepted: this code was used already. Wait for the next one, 30 s at most.', 'code');
  }
  await noteSuccess(app, id);
  return typed.credentials;
}

function waitSentence(count: string) {
  return failure('too-many', 'too-many', `Too many: ${count} in 5 min, ${throttle.perAccount} for an account and ${throttle.perAddress} from one machine are allowed. Wait 5 min.`);
}
