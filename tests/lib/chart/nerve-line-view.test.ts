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
  it('gives an age in minutes for two hours, then in hours', () => {
    const agesAt = (time: string) => lineAt(ulnarStable().state, time).sites.map((site) => site.ageText);
    expect(agesAt('11:40:00')).toEqual(['62\u00a0min', '62\u00a0min', '61\u00a0min', '60\u00a0min']);
    expect(agesAt('12:38:30')).toEqual(['2\u00a0h', '2\u00a0h', '119\u00a0min', '119\u00a0min']);
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
    expect([upper, lesion, forearm, distal].map((segment) => segment?.textPriority)).toEqual([null, 'alert', null, null]);
    expect(lineAt(ulnarAlert().state, '10:43:20').sites.map((site) => site.priority)).toEqual(['alert', 'alert', null, null]);
  });
});

describe('nerveLineView of what is not known', () => {
  it('is an outline everywhere after a risk step, its sites dim', () => {
    const line = lineAt(ulnarStable().give('10:41:20', lifted).state, '10:41:50');
    expect(line.segments.every((segment) => segment.isUntested)).toBe(true);
    expect(line.sites.every((site) => site.isDim)).toBe(true);
    expect(line.segments.map((segment) => segment.text)).toEqual(['was 61\u00a0m/s', 'was 53\u00a0m/s', 'was 59\u00a0m/s', 'was 2.90\u00a0ms']);
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
  it('says a velocity as what it was once both its runs are past the freshness limit', () => {
    const { state } = ulnarStable();
    const textsAt = (time: string) => lineAt(state, time).segments.map((segment) => segment.text);
    // The runs are of 10:37:10, 10:38:00, 10:38:40 and 10:39:10: the first pair is past 5 min at 10:43:00.001.
    expect(textsAt('10:43:00')).toEqual(['61\u00a0m/s', '53\u00a0m/s', '59\u00a0m/s', '2.90\u00a0ms']);
    expect(textsAt('10:43:01')).toEqual(['was 61\u00a0m/s', '53\u00a0m/s', '59\u00a0m/s', '2.90\u00a0ms']);
    expect(textsAt('10:44:11')).toEqual(['was 61\u00a0m/s', 'was 53\u00a0m/s', 'was 59\u00a0m/s', 'was 2.90\u00a0ms']);
  });
  it('shows the amplitude itself before there is anything to compare with', () => {
    const line = lineAt(ulnarMonitored().state, '09:53:00');
    expect(line.sites.map((site) => site.text)).toEqual(['8.7\u00a0mV', '9.0\u00a0mV', '9.2\u00a0mV', '9.4\u00a0mV']);
    expect(line.segments.every((segment) => segment.isUntested)).toBe(true);
  });
  it('has nothing to draw for a nerve outside the plan', () => expect(nerveLineView(ulnarStable().state, 'radial', 0).sites).toEqual([]));
});

describe('nerveLineView of a run that is not compared', () => {
  const weak = (script = ulnarStable()) => script.run('10:40:00', 'above-elbow', 9, { adm: [8.4, 6.1] }, { isSupramaximal: false });
  const line = lineAt(weak().state, '10:40:20');

  it('keeps the last response that was compared, dim and with its own age', () => {
    expect(line.sites.map((site) => `${site.text} ${site.ageText} ${site.isDim}`)).toEqual([
      '98\u00a0% 3\u00a0min false', '97\u00a0% 2\u00a0min true', '98\u00a0% 1\u00a0min false', '99\u00a0% 1\u00a0min false',
    ]);
  });
  it('outlines the segments that end there, and only those', () => {
    expect(line.segments.map((segment) => segment.isUntested)).toEqual([true, true, false, false]);
    expect(line.segments.map((segment) => segment.isNotCompared)).toEqual([true, true, false, false]);
  });
  it('says that the velocities of that run are not compared', () => {
    // 150 mm in 10.77 − 8.40 = 2.37 ms; 100 mm in 8.40 − 6.46 = 1.94 ms.
    expect(line.segments.slice(0, 2).map((segment) => segment.text)).toEqual(['63\u00a0m/s, not compared', '52\u00a0m/s, not compared']);
    expect(line.description).toContain('Above elbow to below elbow: 52\u00a0m/s, not compared.');
  });
  it('says a velocity from before as what it was, when the run gave none', () => {
    const script = ulnarStable();
    const unusable = { channelId: 'adm', reading: { kind: 'unusable', reason: 'cautery' } } as const;
    script.run('10:40:00', 'wrist', 14, {}, { readings: [unusable] });
    expect(lineAt(script.state, '10:40:20').segments.map((segment) => segment.text)).toEqual(['61\u00a0m/s', '53\u00a0m/s', 'was 59\u00a0m/s', 'was 2.90\u00a0ms']);
  });
  it('is current again with the next run that is compared', () => {
    const script = weak();
    ulnarRun(script, '10:40:30', 'above-elbow', 0.97, 0.02);
    expect(lineAt(script.state, '10:40:40').segments.some((segment) => segment.isUntested || segment.isNotCompared)).toBe(false);
  });
});

describe('nerveLineView of a lesion that takes amplitude alone', () => {
  const script = ulnarStable();
  for (const time of ['10:39:40', '10:39:55']) ulnarRun(script, time, 'above-elbow', 0.4);
  ulnarRun(script, '10:40:05', 'below-elbow', 0.98);
  ulnarRun(script, '10:40:15', 'wrist', 0.99);
  const line = lineAt(script.state, '10:40:20');

  it('marks the segment and the response, not the velocity, which did not change', () => {
    expect(line.segments[1]).toMatchObject({ priority: 'alert', textPriority: null, text: '54\u00a0m/s' });
    expect(line.sites[1]).toMatchObject({ priority: 'alert', textPriority: 'alert' });
  });
  it('marks no latency at the end where only the amplitude moved', () => {
    ulnarRun(script, '10:40:30', 'wrist', 0.62);
    expect(lineAt(script.state, '10:40:40').segments[3]).toMatchObject({ priority: 'watch', textPriority: null, text: '2.90\u00a0ms' });
  });
  it('marks the place and not the response where only the onset came late', () => {
    const late = ulnarStable();
    ulnarRun(late, '10:39:40', 'wrist', 0.99, 0.4);
    const { sites, segments } = lineAt(late.state, '10:39:50');
    expect(sites[3]).toMatchObject({ priority: 'notice', textPriority: null, text: '99\u00a0%' });
    expect(segments[3]).toMatchObject({ priority: 'notice', textPriority: 'notice', text: '3.30\u00a0ms' });
  });
});

describe('nerveLineView of a lost response', () => {
  const script = ulnarStable().give('10:41:20', lifted);
  ulnarRun(script, '10:41:55', 'above-elbow', 0);
  ulnarRun(script, '10:42:12', 'above-elbow', 0);
  ulnarRun(script, '10:42:49', 'below-elbow', 0.98);
  const line = lineAt(script.state, '10:43:20');

  it('breaks the segment and says the highest current tried', () => {
    expect(line.segments[1]).toMatchObject({ isBroken: true, amplitudeShare: 0, text: 'no response up to 18\u00a0mA', priority: 'alert', textPriority: 'alert' });
  });
  it('says "none" at the site, never 0 %', () => expect(line.sites[1]?.text).toBe('none'));
  it('breaks no other segment', () => expect(line.segments.filter((segment) => segment.isBroken)).toHaveLength(1));
});
