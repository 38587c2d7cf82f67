import { demoPeople as demoCredentials } from '@/db/repositories/people/demo-people';
import { liveMemberships } from '@/db/repositories/people/live-memberships';
import { DEMO_PASSWORD } from '@/db/seeds/demo-people';
import { nextCode } from '@/server/auth/second-factor';
import { failure } from '@/server/failure';
import type { DemoPeopleReply } from '@/lib/contracts/http/account';
import type { ServerContext } from '@/server/server-context';
import { isLoopback } from '@/server/settings/is-loopback';

/** Demo people with their present codes: in demo mode only, asked from this machine only, over its own address only. */
export async function demoPeople(context: ServerContext, address: string): Promise<DemoPeopleReply> {
  const isHere = isLoopback(address) && isLoopback(new URL(context.publicUrl).hostname);
  if (!context.isDemo || !isHere) throw failure('not-found', 'not-found', 'Not found: demo mode is off.');
  const people = await demoCredentials(context.database.app);
  return { people: await Promise.all(people.map((person) => describePerson(context, person))) };
}

type DemoCredentials = Awaited<ReturnType<typeof demoCredentials>>[number];

async function describePerson(context: ServerContext, person: DemoCredentials): Promise<DemoPeopleReply['people'][number]> {
  const memberships = await liveMemberships(context.database.app, person.personId);
  const { code, secondsLeft } = await nextCode(person.secondFactorSecret, person.secondFactorStep, context.nowMs());
  return {
    email: person.email,
    displayName: person.displayName,
    hospitalName: memberships[0]?.hospitalName ?? '',
    password: DEMO_PASSWORD,
    code,
    codeSecondsLeft: secondsLeft,
    roles: memberships.map((membership) => membership.role),
  };
}
