import { isBearer } from '@/server/auth/access-token';
import { requireSession } from '@/server/auth/read-session';
import { reauthenticate } from '@/server/auth/reauthenticate';
import { signIn } from '@/server/auth/sign-in';
import { signOut } from '@/server/auth/sign-out';
import { whoAsks } from '@/server/auth/who-asks';
import { askForScreen } from '@/server/commands/ask-for-screen';
import { giveCommand } from '@/server/commands/give-command';
import { pairScreen } from '@/server/commands/pair-screen';
import { planCase } from '@/server/commands/plan-case';
import { revokeScreen } from '@/server/commands/revoke-screen';
import type { Door } from '@/server/doors/door-parts';
import { failure } from '@/server/failure';
import type { CommandDoors } from '@/server/fascicle-global';
import { screensOfCase } from '@/server/queries/screens-of-case';

/** Every command that a route may ask for. Who asks is read from the cookie, never from the input. */
export const commandDoors: { readonly [Name in keyof CommandDoors]: Door<CommandDoors[Name]['input'], CommandDoors[Name]['answer']> } = {
  'plan-case': async (parts, request, source) => planCase(parts.context, await whoAsks(parts, source), request),
  'give-command': async (parts, { caseId, request }, source) => giveCommand(parts.context, await whoAsks(parts, source), caseId, request),
  'pair-screen': async (parts, asked, source) => pairScreen(parts.context, await whoAsks(parts, source), asked, parts.pairingLimit),
  'revoke-screen': async (parts, asked, source) => {
    const signedIn = await whoAsks(parts, source);
    await revokeScreen(parts.context, signedIn, asked);
    return screensOfCase(parts.context, parts.presence, signedIn, asked.caseId);
  },
  'ask-for-screen': async ({ context, pairingLimit }, _input, source) => {
    const { reply, cookie } = await askForScreen(context, source, pairingLimit);
    return { isAnswered: true, answer: reply, cookies: cookie === null ? [] : [cookie] };
  },
  'sign-in': ({ context }, typed, { address }) => signIn(context, typed, address),
  'sign-out': async ({ context }, { sessionId }) => {
    await signOut(context, sessionId);
    return {};
  },
  // What is signed asks a person again: a token is never enough.
  reauthenticate: async ({ context }, typed, { cookie, authorization, address }) => {
    if (isBearer(authorization)) throw failure('not-signed-in', 'not-with-a-token', 'Not with a token: password and code are given again by a person who is signed in.');
    return reauthenticate(context, await requireSession(context, cookie), typed, address);
  },
};
