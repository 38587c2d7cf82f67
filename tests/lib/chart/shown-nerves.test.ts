import { expect, it } from 'vitest';

import { shownNerves } from '@/lib/chart/shown-nerves';
import { absent } from '@/tests/support/case-builder';
import { monitoredUlnar } from '@/tests/support/ulnar-case';
import { momentAt } from '@/tests/support/theatre-gallery/case-script';
import { ulnarAlert } from '@/tests/support/theatre-gallery/ulnar-case';

it('shownNerves draws the nerves at risk, and the control only while something is open on it', () => {
  const script = monitoredUlnar();
  expect(shownNerves(script.state, 'stable', script.nowMs).map((view) => view.nerveId)).toEqual(['ulnar']);
  for (let count = 0; count < 2; count += 1) script.run('median-wrist', { apb: absent(30) });
  expect(shownNerves(script.state, 'alert', script.nowMs).map((view) => view.nerveId)).toEqual(['ulnar', 'median']);
});

it('shownNerves draws outlines while nothing is monitored, and nothing after the close', () => {
  const script = monitoredUlnar();
  const [paused] = shownNerves(script.state, 'paused', script.nowMs);
  expect(paused?.segments.every((segment) => segment.isUntested)).toBe(true);
  expect(shownNerves(script.state, 'closed', script.nowMs)).toEqual([]);
});

it('shownNerves draws nothing as current in take-down, whatever leads', () => {
  const { state } = ulnarAlert().give('10:43:30', { name: 'change-phase', phase: 'take-down', reason: null });
  const [ulnar] = shownNerves(state, 'alert', Date.parse(momentAt('10:43:40')));
  expect(ulnar?.segments.every((segment) => segment.isUntested)).toBe(true);
  expect(ulnar?.segments[1]).toMatchObject({ priority: 'alert', text: 'was 31\u00a0m/s' });
});
