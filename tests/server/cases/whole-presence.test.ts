import { describe, expect, test } from 'vitest';

import type { PresentViewer } from '@/db/repositories/presence/elsewhere';
import { wallsIn, wholePresence } from '@/server/cases/whole-presence';

const at = (minute: number) => `2027-03-14T10:${String(minute).padStart(2, '0')}:00.000Z`;
const desk = (minute: number): PresentViewer => ({ personId: 'person-1', screenId: null, role: 'neurophysiologist', displayName: 'Neurophysiologist', isDesk: true, since: at(minute) });
const physician = (minute: number): PresentViewer => ({ personId: 'person-2', screenId: null, role: 'physician', displayName: 'Supervising physician', isDesk: false, since: at(minute) });
const wall = (screenId: string): PresentViewer => ({ personId: null, screenId, role: 'screen', displayName: '', isDesk: false, since: at(0) });
const nobody = { viewers: [], deskGoneAt: null };

describe('wholePresence', () => {
  test.each([
    ['nobody anywhere', [nobody, nobody], false, null],
    ['a desk at another process', [nobody, { viewers: [desk(5)], deskGoneAt: null }], true, at(5)],
    ['desks at both: since the first', [{ viewers: [desk(7)], deskGoneAt: at(6) }, { viewers: [desk(5)], deskGoneAt: null }], true, at(5)],
    ['none any more: since the last went', [{ viewers: [], deskGoneAt: at(6) }, { viewers: [physician(1)], deskGoneAt: at(9) }], false, at(9)],
  ])('knows of %s', (_what, parts, deskConnected, deskSince) => {
    expect(wholePresence(parts)).toMatchObject({ deskConnected, deskSince });
  });

  test('names each person once in a role, from the first connection on, the earliest first, and no wall', () => {
    const { peopleConnected } = wholePresence([{ viewers: [desk(8), wall('w-1')], deskGoneAt: null }, { viewers: [physician(9), desk(3), physician(4)], deskGoneAt: null }]);
    expect(peopleConnected).toEqual([
      { personId: 'person-1', role: 'neurophysiologist', displayName: 'Neurophysiologist', since: at(3) },
      { personId: 'person-2', role: 'physician', displayName: 'Supervising physician', since: at(4) },
    ]);
  });

  test('counts a wall with two connections once', () => {
    expect(wholePresence([{ viewers: [wall('w-1'), wall('w-2')], deskGoneAt: null }, { viewers: [wall('w-1')], deskGoneAt: null }]).wallsConnected).toBe(2);
    expect([...wallsIn([wall('w-1'), desk(1), wall('w-1')])]).toEqual(['w-1']);
  });
});
