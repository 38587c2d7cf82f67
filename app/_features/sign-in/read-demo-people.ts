import { ask } from '@/app/_live/api';

/** One invented person with what is needed to sign in as them. */
export interface DemoPerson {
  readonly email: string;
  readonly displayName: string;
  readonly hospitalName: string;
  readonly password: string;
  readonly code: string;
}

function isPerson(value: unknown): value is DemoPerson {
  if (typeof value !== 'object' || value === null) return false;
  const row = value as Record<string, unknown>;
  return ['email', 'displayName', 'hospitalName', 'password', 'code'].every((key) => typeof row[key] === 'string');
}

const contract = {
  safeParse: (value: unknown) => {
    const people: unknown = typeof value === 'object' && value !== null && 'people' in value ? value.people : null;
    return Array.isArray(people) && people.every(isPerson) ? ({ success: true, data: people } as const) : ({ success: false } as const);
  },
};

/** The people of the demo with their present codes. */
export const readDemoPeople = (): Promise<readonly DemoPerson[]> => ask<readonly DemoPerson[]>('/api/demo-people', contract);
