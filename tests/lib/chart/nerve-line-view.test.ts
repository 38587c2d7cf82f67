import { describe, expect, it } from 'vitest';

import { nerveLineView } from '@/lib/chart/nerve-line-view';
import type { CaseState } from '@/lib/case/case-state';
import { momentAt } from '@/tests/support/theatre-gallery/case-script';
import { ulnarAlert, ulnarMonitored, ulnarRun, ulnarStable } from '@/tests/support/theatre-gallery/ulnar-case';

function lineAt(state: CaseState, time: string) {
  return nerveLineView(state, 'ulnar', Date.parse(momentAt(time)));
}

const lifted = { name: 'log-step', stepId: 'nerve-lifted', label: null } as const;

describe('nerveLineView of a stable nerve', () => {
  const line = lineAt(ulnarStable().state, '10:39:30');

  it('shows each response as % of baseline with its age', () => {
    expect(line.sites.map((site) => `${site.name} ${site.text} ${site.ageText}`)).toEqual([
      'Axilla 98\u00a0% 2\u00a0min', 'Above elbow 97\u00a0% 1\u00a0min', 'Below elbow 98\u00a0% 50\u00a0s', 'Wrist 99\u00a0% 20\u00a0s',
    ]);
    expect(line.sites.some((site) => site.isDim || site.priority !== null)).toBe(false);
  });
  it('shows velocities, and the distal latency in place of one', () => {
    // 150 mm in 10.77 − 8.33 = 2.44 ms; 100 mm in 8.33 − 6.46 = 1.87 ms; 210 mm in 6.46 − 2.90 = 3.56 ms.
    expect(line.segments.map((segment) => segment.text)).toEqual(['61\u00a0m/s', '53\u00a0m/s', '59\u00a0m/s', '2.90\u00a0ms']);
  });
  it('ends at the muscle it was recorded from', () => expect(line.end).toEqual({ caption: 'Muscle', name: 'ADM', positionMm: 530 }));
  it('says all of it in sentences', () => {
    expect(line.description).toContain('Ulnar nerve, recorded at ADM.');
    expect(line.description).toContain('Above elbow to below elbow: 53\u00a0m/s.');
    expect(line.description).toContain('Wrist to ADM: 2.90\u00a0ms.');
  });
});

describe('nerveLineView of a lesion between above and below elbow', () => {
  const [upper, lesion, forearm, distal] = lineAt(ulnarAlert().state, '10:43:20').segments;

  it('is thin where the lesion is: 38 % above over 98 % below', () => expect(lesion?.amplitudeShare).toBeCloseTo(38 / 98, 3));
  it('keeps the nerve above the lesion thick: 36 % over 38 %', () => expect(upper?.amplitudeShare).toBeCloseTo(36 / 38, 3));
  it('keeps the nerve below it thick', () => {
    expect(forearm?.amplitudeShare).toBeCloseTo(98 / 99, 3);
    expect(distal?.amplitudeShare).toBeCloseTo(0.99, 3);
  });
  it('shortens the dashes where conduction slowed: 1.85 ms at baseline over 9.69 − 6.47 = 3.22 ms', () => {
    expect(lesion?.velocityShare).toBeCloseTo(1.85 / 3.22, 3);
    expect(upper?.velocityShare).toBeCloseTo(1, 3);
  });
  it('carries the priority at the lesion and at the sites behind it only', () => {
    expect([upper, lesion, forearm, distal].map((segment) => segment?.priority)).toEqual([null, 'alert', null, null]);
    expect(lineAt(ulnarAlert().state, '10:43:20').sites.map((site) => site.priority)).toEqual(['alert', 'alert', null, null]);
  });
});

describe('nerveLineView of what is not known', () => {
  it('is an outline everywhere after a risk step, its sites dim', () => {
    const line = lineAt(ulnarStable().give('10:41:20', lifted).state, '10:41:50');
    expect(line.segments.every((segment) => segment.isUntested)).toBe(true);
    expect(line.sites.every((site) => site.isDim)).toBe(true);
  });
  it('is an outline where only one end was tested since', () => {
    const script = ulnarStable().give('10:41:20', lifted);
    ulnarRun(script, '10:41:55', 'wrist', 0.99);
    ulnarRun(script, '10:42:10', 'below-elbow', 0.98);
    expect(lineAt(script.state, '10:42:20').segments.map((segment) => segment.isUntested)).toEqual([true, true, false, false]);
  });
  it('takes no pair across the first abnormal run of a notice', () => {
    const script = ulnarStable();
    ulnarRun(script, '10:39:50', 'above-elbow', 0.4, 1.33);
    expect(lineAt(script.state, '10:40:00').segments.map((segment) => segment.isUntested)).toEqual([true, true, true, true]);
  });
  it('dims a response one millisecond past the freshness limit of 5 min, not at it', () => {
    const { state } = ulnarStable();
    const wristAt = Date.parse(momentAt('10:39:10'));
    const isDim = (nowMs: number) => nerveLineView(state, 'ulnar', nowMs).sites[3]?.isDim;
    expect(isDim(wristAt + 300_000)).toBe(false);
    expect(isDim(wristAt + 300_001)).toBe(true);
  });
  it('shows the amplitude itself before there is anything to compare with', () => {
    const line = lineAt(ulnarMonitored().state, '09:53:00');
    expect(line.sites.map((site) => site.text)).toEqual(['8.7\u00a0mV', '9.0\u00a0mV', '9.2\u00a0mV', '9.4\u00a0mV']);
    expect(line.segments.every((segment) => segment.isUntested)).toBe(true);
  });
  it('has nothing to draw for a nerve outside the plan', () => expect(nerveLineView(ulnarStable().state, 'radial', 0).sites).toEqual([]));
});

describe('nerveLineView of a lost response', () => {
  const script = ulnarStable().give('10:41:20', lifted);
  ulnarRun(script, '10:41:55', 'above-elbow', 0);
  ulnarRun(script, '10:42:12', 'above-elbow', 0);
  ulnarRun(script, '10:42:49', 'below-elbow', 0.98);
  const line = lineAt(script.state, '10:43:20');

  it('breaks the segment and says the highest current tried', () => {
    expect(line.segments[1]).toMatchObject({ isBroken: true, amplitudeShare: 0, text: 'no response up to 18\u00a0mA', priority: 'alert' });
  });
  it('says "none" at the site, never 0 %', () => expect(line.sites[1]?.text).toBe('none'));
  it('breaks no other segment', () => expect(line.segments.filter((segment) => segment.isBroken)).toHaveLength(1));
});
