import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { locateChange, type SiteVerdict } from '@/lib/change/locate-change';

/** Sites from proximal to distal: a abnormal, n normal, u untested. */
const nerve = (letters: string, positionsMm: readonly number[] = [0, 100, 200, 260, 400]) => ({
  sites: [...letters].map((letter, index): SiteVerdict => ({
    siteId: `site-${index}`,
    positionMm: positionsMm[index] ?? index * 100,
    verdict: letter === 'a' ? 'abnormal' : letter === 'n' ? 'normal' : 'untested',
  })),
});
const segment = (proximal: number, distal: number) => ({ kind: 'segment', proximalSiteId: `site-${proximal}`, distalSiteId: `site-${distal}` });

describe('locateChange', () => {
  it.each([
    ['the segment between neighbours', 'an', segment(0, 1)],
    ['the segment in a longer nerve', 'aannn', segment(1, 2)],
    ['the segment although sites beyond it are untested', 'uanu', segment(1, 2)],
    ['outside, when the most distal site is abnormal too', 'aaa', { kind: 'outside', beyond: 'distal' }],
    ['outside, from the most distal site alone', 'uua', { kind: 'outside', beyond: 'distal' }],
    ['nothing abnormal', 'nnn', { kind: 'nothing-abnormal' }],
    ['not known: the site between', 'aun', { kind: 'not-known', nextSiteId: 'site-1' }],
    ['not known: the middle in mm, not in number', 'auuun', { kind: 'not-known', nextSiteId: 'site-2' }],
    ['not known: the stretch to the last site', 'auu', { kind: 'not-known', nextSiteId: 'site-1' }],
    ['not known: only the last one is left', 'aau', { kind: 'not-known', nextSiteId: 'site-2' }],
    ['not known: nothing tested', 'uuuuu', { kind: 'not-known', nextSiteId: 'site-2' }],
    ['not known: normal distally, untested proximally', 'uun', { kind: 'not-known', nextSiteId: 'site-1' }],
    ['contradictory: normal proximal to abnormal', 'na', { kind: 'contradictory', nextSiteId: 'site-1' }],
    ['contradictory: the first abnormal site past a normal one', 'anuaa', { kind: 'contradictory', nextSiteId: 'site-3' }],
  ])('answers %s (%s)', (_case, letters, expected) => {
    expect(locateChange(nerve(letters))).toEqual(expected);
  });

  it('halves the unknown stretch: of 0 to 400 mm, 260 is nearer to the middle than 130', () => {
    expect(locateChange(nerve('auun', [0, 130, 260, 400]))).toEqual({ kind: 'not-known', nextSiteId: 'site-2' });
  });

  it('takes the proximal one of two sites equally near to the middle', () => {
    expect(locateChange(nerve('auun', [0, 100, 300, 400]))).toEqual({ kind: 'not-known', nextSiteId: 'site-1' });
  });

  it('refuses a nerve without sites and a position beyond a limb', () => {
    expect(() => locateChange({ sites: [] })).toThrow(RangeError);
    expect(() => locateChange(nerve('an', [0, 2000]))).toThrow(RangeError);
  });

  it('always finds the harmed segment by testing the site it asks for', () => {
    const harmed = fc.integer({ min: 2, max: 12 }).chain((count) => fc.tuple(fc.constant(count), fc.integer({ min: 1, max: count - 1 })));
    fc.assert(
      fc.property(harmed, ([count, firstNormal]) => {
        const truth = (index: number) => (index < firstNormal ? 'abnormal' : 'normal');
        let sites = nerve('u'.repeat(count), Array.from({ length: count }, (_, index) => index * 50)).sites;
        let location = locateChange({ sites });
        let tests = 0;
        while (location.kind === 'not-known') {
          const nextSiteId = location.nextSiteId;
          sites = sites.map((site, index) => (site.siteId === nextSiteId ? { ...site, verdict: truth(index) } : site));
          location = locateChange({ sites });
          tests += 1;
        }
        expect(location).toEqual(segment(firstNormal - 1, firstNormal));
        expect(tests).toBeLessThanOrEqual(Math.ceil(Math.log2(count)) + 2);
      }),
    );
  });
});
