import { requireSession } from '@/server/auth/read-session';
import { reauthenticate } from '@/server/auth/reauthenticate';
import { signIn } from '@/server/auth/sign-in';
import { signOut } from '@/server/auth/sign-out';
import { askForScreen } from '@/server/commands/ask-for-screen';
import { giveCommand } from '@/server/commands/give-command';
import { pairScreen } from '@/server/commands/pair-screen';
import { planCase } from '@/server/commands/plan-case';
import { revokeScreen } from '@/server/commands/revoke-screen';
import type { Door } from '@/server/doors/door-parts';
import type { CommandDoors } from '@/server/fascicle-global';
import { screensOfCase } from '@/server/queries/screens-of-case';

/** Every command that a route may ask for. Who asks is read from the cookie, never from the input. */
export const commandDoors: { readonly [Name in keyof CommandDoors]: Door<CommandDoors[Name]['input'], CommandDoors[Name]['answer']> } = {
  'plan-case': async ({ context }, request, { cookie }) => planCase(context, await requireSession(context, cookie), request),
  'give-command': async ({ context }, { caseId, request }, { cookie }) => giveCommand(context, await requireSession(context, cookie), caseId, request),
  'pair-screen': async ({ context, pairingLimit }, asked, { cookie }) => pairScreen(context, await requireSession(context, cookie), asked, pairingLimit),
  'revoke-screen': async ({ context, presence }, asked, { cookie }) => {
    const signedIn = await requireSession(context, cookie);
    await revokeScreen(context, signedIn, asked);
    return screensOfCase(context, presence, signedIn, asked.caseId);
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
  reauthenticate: async ({ context }, typed, { cookie, address }) => reauthenticate(context, await requireSession(context, cookie), typed, address),
};
