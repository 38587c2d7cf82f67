import { describe, expect, it } from 'vitest';

import { nerveLineView } from '@/lib/chart/nerve-line-view';
import { notMonitoredView } from '@/lib/chart/not-monitored-view';
import { momentAt } from '@/tests/support/theatre-gallery/case-script';
import { ulnarMonitored, ulnarStable } from '@/tests/support/theatre-gallery/ulnar-case';

describe('notMonitoredView', () => {
  const live = nerveLineView(ulnarStable().state, 'ulnar', Date.parse(momentAt('10:39:30')));
  const view = notMonitoredView(live);

  it('leaves nothing that looks calm', () => {
    expect(live.segments.some((segment) => segment.isUntested)).toBe(false);
    expect(view.segments.every((segment) => segment.isUntested && segment.isDim)).toBe(true);
    expect(view.sites.every((site) => site.isDim)).toBe(true);
  });
  it('says each velocity in the past tense, once', () => {
    const past = ['was 61\u00a0m/s', 'was 53\u00a0m/s', 'was 59\u00a0m/s', 'was 2.90\u00a0ms'];
    expect(view.segments.map((segment) => segment.text)).toEqual(past);
    expect(notMonitoredView(view).segments.map((segment) => segment.text)).toEqual(past);
  });
  it('says the velocities of the baseline in the past tense too', () => {
    const planned = nerveLineView(ulnarMonitored().state, 'ulnar', Date.parse(momentAt('10:24:00')));
    expect(notMonitoredView(planned).segments[0]?.text).toBe('was 61\u00a0m/s');
  });
  it.each(['61\u00a0m/s, not compared', 'no response up to 18\u00a0mA'])('leaves "%s" as it is', (text) => {
    expect(notMonitoredView({ ...live, segments: [{ ...live.segments[0]!, text }] }).segments[0]?.text).toBe(text);
  });
  it('leaves a reason as it is', () => {
    const reason = { ...live.segments[0]!, text: 'distance not measured', shortText: 'no mm' };
    expect(notMonitoredView({ ...live, segments: [reason] }).segments[0]?.text).toBe('distance not measured');
  });
  it('hides no value', () => expect(view.sites.map((site) => site.text)).toEqual(live.sites.map((site) => site.text)));
});
