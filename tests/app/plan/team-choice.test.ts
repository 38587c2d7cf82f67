import { expect, it } from 'vitest';

import { nobodyChosen, teamFrom } from '@/app/_features/plan/team-choice';

const people = [
  { hospitalId: 'h1', personId: 'p1', displayName: 'Supervising physician', role: 'physician' as const },
  { hospitalId: 'h1', personId: 'n2', displayName: 'Neurophysiologist, relief', role: 'neurophysiologist' as const },
  { hospitalId: 'h2', personId: 's9', displayName: 'Surgeon', role: 'surgeon' as const },
];

it('teamFrom sends the people of the plan’s hospital with their roles, and nobody else', () => {
  expect(teamFrom(nobodyChosen, 'h1', people)).toEqual([]);
  expect(teamFrom({ physician: 'p1', surgeon: 's9', relief: 'n2' }, 'h1', people)).toEqual([
    { personId: 'p1', role: 'physician' },
    { personId: 'n2', role: 'neurophysiologist' },
  ]);
  expect(teamFrom({ ...nobodyChosen, surgeon: 'p1' }, 'h1', people)).toEqual([]);
});
