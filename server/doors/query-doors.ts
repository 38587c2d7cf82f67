import { requireSession } from '@/server/auth/read-session';
import type { Door } from '@/server/doors/door-parts';
import { failure } from '@/server/failure';
import type { QueryDoors } from '@/server/fascicle-global';
import { caseAccess } from '@/server/queries/case-access';
import { caseEntries } from '@/server/queries/case-entries';
import { caseHead } from '@/server/queries/case-head';
import { casesForActor } from '@/server/queries/cases-for-actor';
import { demoPeople } from '@/server/queries/demo-people';
import { health } from '@/server/queries/health';
import { screenStatus } from '@/server/queries/screen-status';
import { screensOfCase } from '@/server/queries/screens-of-case';
import { sessionForActor } from '@/server/queries/session-for-actor';

/** Every question that a route or a page may ask. */
export const queryDoors: { readonly [Name in keyof QueryDoors]: Door<QueryDoors[Name]['input'], QueryDoors[Name]['answer']> } = {
  session: async ({ context }, _input, { cookie }) => sessionForActor(context, await requireSession(context, cookie)),
  cases: async ({ context }, _input, { cookie }) => casesForActor(context, await requireSession(context, cookie)),
  'case-access': async ({ context }, { caseId }, { cookie }) => caseAccess(context, await requireSession(context, cookie), caseId),
  'case-head': async ({ context }, { caseId }, { cookie }) => caseHead(context, await requireSession(context, cookie), caseId),
  'case-entries': async ({ context }, asked, { cookie }) => caseEntries(context, (await requireSession(context, cookie)).actor, asked),
  screens: async ({ context, presence }, { caseId }, { cookie }) => screensOfCase(context, presence, await requireSession(context, cookie), caseId),
  screen: async ({ context }, _input, { cookie }) => {
    const status = await screenStatus(context, cookie);
    if (status === null) throw failure('not-found', 'no-screen', 'Not asked: this screen has no pairing code, or it is older than 10 min. Ask for a new one.');
    return status;
  },
  'demo-people': ({ context }, _input, { address }) => demoPeople(context, address),
  health: ({ context, loop }) => health(context, loop),
};
