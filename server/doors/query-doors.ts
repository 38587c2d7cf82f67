import { whoAsks } from '@/server/auth/who-asks';
import type { Door } from '@/server/doors/door-parts';
import { failure } from '@/server/failure';
import type { QueryDoors } from '@/server/fascicle-global';
import { caseAccess } from '@/server/queries/case-access';
import { caseEntries } from '@/server/queries/case-entries';
import { caseHead } from '@/server/queries/case-head';
import { casesForActor } from '@/server/queries/cases-for-actor';
import { demoPeople } from '@/server/queries/demo-people';
import { health } from '@/server/queries/health';
import { peopleForPlanning } from '@/server/queries/people-for-planning';
import { screenStatus } from '@/server/queries/screen-status';
import { screensOfCase } from '@/server/queries/screens-of-case';
import { sessionForActor } from '@/server/queries/session-for-actor';

/** Every question that a route or a page may ask. */
export const queryDoors: { readonly [Name in keyof QueryDoors]: Door<QueryDoors[Name]['input'], QueryDoors[Name]['answer']> } = {
  session: async (parts, _input, source) => sessionForActor(parts.context, await whoAsks(parts, source)),
  people: async (parts, _input, source) => peopleForPlanning(parts.context, await whoAsks(parts, source)),
  cases: async (parts, _input, source) => casesForActor(parts.context, await whoAsks(parts, source)),
  'case-access': async (parts, { caseId }, source) => caseAccess(parts.context, await whoAsks(parts, source), caseId),
  'case-head': async (parts, { caseId }, source) => caseHead(parts.context, await whoAsks(parts, source), caseId),
  'case-entries': async (parts, asked, source) => caseEntries(parts.context, (await whoAsks(parts, source)).actor, asked),
  screens: async (parts, { caseId }, source) => screensOfCase(parts.context, parts.presence, await whoAsks(parts, source), caseId),
  screen: async ({ context }, _input, { cookie }) => {
    const status = await screenStatus(context, cookie);
    if (status === null) throw failure('not-found', 'no-screen', 'Not asked: this screen has no pairing code, or it is older than 10 min. Ask for a new one.');
    return status;
  },
  'demo-people': ({ context }, _input, { address }) => demoPeople(context, address),
  health: ({ context, loop }) => health(context, loop),
};
