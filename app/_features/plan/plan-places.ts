import type { SessionReply } from '@/lib/contracts/http/replies';

/** A hospital a person plans for, with its theatres. */
export interface PlanPlace {
  readonly hospitalId: string;
  readonly hospitalName: string;
  readonly theatreNames: readonly string[];
}

/** Where a person may plan: each hospital that has them as neurophysiologist and has a theatre, in the order of their memberships. */
export function planPlaces({ memberships, theatres }: Pick<SessionReply, 'memberships' | 'theatres'>): readonly PlanPlace[] {
  const planning = memberships.filter((membership, index) => {
    const isFirst = memberships.findIndex((other) => other.hospitalId === membership.hospitalId && other.role === 'neurophysiologist') === index;
    return membership.role === 'neurophysiologist' && isFirst;
  });
  return planning
    .map(({ hospitalId, hospitalName }) => ({ hospitalId, hospitalName, theatreNames: theatres.filter((theatre) => theatre.hospitalId === hospitalId).map(({ name }) => name) }))
    .filter((place) => place.theatreNames.length > 0);
}
