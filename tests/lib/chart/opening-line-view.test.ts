import { describe, expect, it } from 'vitest';

import { caseCourse } from '@/lib/case/course/case-course';
import { openingLineView } from '@/lib/chart/opening-line-view';
import { everyKindCase } from '@/tests/lib/case/every-kind';
import { recordCase } from '@/tests/support/record-case';
import { adm, openedCase } from '@/tests/support/ulnar-case';

const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('openingLineView', () => {
  it('openingLineView draws the means of the opening baseline in full, also after the nerve was moved', () => {
    const view = openingLineView(caseCourse(recordCase().entries), 'ulnar')!;
    // Means of 98, 100 and 102 % of 8,600, 8,900, 9,200 and 9,400 µV.
    expect(view.sites.map(({ text, positionMm, isDim }) => [plain(text), positionMm, isDim])).toEqual([['8.6 mV', 0, false], ['8.9 mV', 150, false], ['9.2 mV', 250, false], ['9.4 mV', 460, false]]);
    expect(view.segments.map(({ text, amplitudeShare, isUntested }) => [plain(text), amplitudeShare, isUntested])).toEqual([['61 m/s', 1, false], ['54 m/s', 1, false], ['59 m/s', 1, false], ['2.90 ms', 1, false]]);
    expect(plain(view.description)).toContain('Above elbow 8.9 mV.');
  });

  it('openingLineView says where no baseline was accepted', () => {
    const script = openedCase().at('10:05');
    for (const site of ['axilla', 'wrist'] as const) script.wait(1000).run(site, { adm: adm(site) }, { purpose: 'baseline' });
    script.wait(1000).give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Two sites only' });
    const view = openingLineView(caseCourse(script.entries), 'ulnar')!;
    expect(view.sites.map(({ text, isDim }) => [plain(text), isDim])).toEqual([['8.6 mV', false], ['no baseline', true], ['no baseline', true], ['9.4 mV', false]]);
    expect(view.segments.map((segment) => segment.isUntested)).toEqual([true, true, true, false]);
  });

  it('openingLineView is null before a baseline', () => {
    expect(openingLineView(caseCourse(openedCase().entries), 'ulnar')).toBeNull();
    expect(openingLineView(caseCourse(everyKindCase().entries), 'median')?.sites[0]?.text).toMatch(/11\.0/);
  });
});
