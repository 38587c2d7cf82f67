import type { PlanCaseRequest } from '@/lib/contracts/http/commands';
import type { PeopleReply } from '@/lib/contracts/http/replies';

/** The parts of a team that are chosen at planning, besides the planner. */
export const teamFields = [
  { key: 'physician', label: 'Supervising physician', role: 'physician' },
  { key: 'surgeon', label: 'Surgeon', role: 'surgeon' },
  { key: 'relief', label: 'Relief of the neurophysiologist', role: 'neurophysiologist' },
] as const;

/** People to choose from, as far as they are known. */
export interface KnownPeople {
  readonly people: PeopleReply['people'];
  readonly isPending: boolean;
  /** Why they are not known, in a sentence. */
  readonly problem: string | null;
}

/** Before the server was asked. */
export const noPeopleKnown: KnownPeople = { people: [], isPending: false, problem: null };

/** Ids of the chosen people; empty where nobody is chosen. */
export type ChosenTeam = Readonly<Record<(typeof teamFields)[number]['key'], string>>;

/** Nobody chosen yet. */
export const nobodyChosen: ChosenTeam = { physician: '', surgeon: '', relief: '' };

/** The team as it is sent: only people who hold that role in the hospital of the plan. A choice made for another hospital is left behind. */
export function teamFrom(chosen: ChosenTeam, hospitalId: string, people: PeopleReply['people']): NonNullable<PlanCaseRequest['team']> {
  return teamFields
    .map(({ key, role }) => ({ personId: chosen[key], role }))
    .filter(({ personId, role }) => people.some((one) => one.personId === personId && one.role === role && one.hospitalId === hospitalId));
}
