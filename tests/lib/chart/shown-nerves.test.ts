import { expect, it } from 'vitest';

import { shownNerves } from '@/lib/chart/shown-nerves';
import { absent } from '@/tests/support/case-builder';
import { monitoredUlnar } from '@/tests/support/ulnar-case';

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
