import { describe, expect, it } from 'vitest';

import type { CasePlan } from '@/lib/case/plan';
import { planProblem } from '@/lib/case/plan-problem';
import { spacingProblem } from '@/lib/case/spacing-problem';
import { templates } from '@/lib/reference/templates/templates';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';

const [ulnar, median] = ulnarAtElbow.nerves as [CasePlan['nerves'][number], CasePlan['nerves'][number]];
const withUlnar = (sites: typeof ulnar.sites): Partial<CasePlan> => ({ nerves: [{ ...ulnar, sites }, median] });
const moved = (positionMm: number) => ulnar.sites.map((site) => (site.id === 'above-elbow' ? { ...site, positionMm } : site));
const keyed = (hotkey: string) => ulnar.sites.map((site) => (site.id === 'above-elbow' ? { ...site, hotkey } : site));
const rules = (change: Partial<CasePlan['rules']>): Partial<CasePlan> => ({ rules: { ...ulnarAtElbow.rules, ...change } });
const paths = (change: object): Partial<CasePlan> => ({ paths: [{ ...ulnarAtElbow.paths[0]!, ...change }, ...ulnarAtElbow.paths.slice(1)] });

describe('planProblem', () => {
  it.each(templates.map((plan) => [plan.templateId, plan] as const))('planProblem finds none in %s', (_id, plan) => {
    expect(planProblem(plan)).toBeNull();
  });

  it.each([
    ['Site twice: wrist', withUlnar([...ulnar.sites.slice(0, 3), { ...ulnar.sites[3]!, positionMm: 470 }, ulnar.sites[3]!])],
    ['Site name twice: Ulnar Wrist', withUlnar([...ulnar.sites.slice(0, 3), { ...ulnar.sites[2]!, id: 'x', name: 'Wrist', positionMm: 300 }, ulnar.sites[3]!])],
    ['Sites of Ulnar out of order', withUlnar(moved(250))],
    ['Sites of Ulnar too near: two lie 0.9 mm apart', withUlnar(moved(249.1))],
    ['Channel ADM at 530 mm lies before the last site', withUlnar(ulnar.sites.map((site) => (site.id === 'wrist' ? { ...site, positionMm: 530 } : site)))],
    ['Channel APB names no nerve of the plan: radial', { channels: ulnarAtElbow.channels.map((one) => (one.id === 'apb' ? { ...one, nerveId: 'radial' } : one)) }],
    ['No nerve at risk', { nerves: ulnarAtElbow.nerves.map((nerve) => ({ ...nerve, role: 'control' as const })) }],
    ['names no nerve of the plan: radial', paths({ nerveId: 'radial' })],
    ['names no site of Ulnar: knee', paths({ siteId: 'knee' })],
    ['names no channel of the plan: edb', paths({ channelId: 'edb' })],
    ['must be called axilla/adm', paths({ id: 'axilla/abc' })],
    ['Path twice: above-elbow/adm', { paths: [...ulnarAtElbow.paths, ulnarAtElbow.paths[2]!] }],
    ['No required path on Ulnar', { paths: ulnarAtElbow.paths.map((path) => ({ ...path, isRequired: false })) }],
    ['Closing site unknown: knee', { closingSiteId: 'knee' }],
    ['Key twice: 1', withUlnar(keyed('1'))],
    ['Key of a site must be a digit: v', withUlnar(keyed('v'))],
    ['Key of a step taken: r', { steps: ulnarAtElbow.steps.map((step, index) => (index === 0 ? { ...step, hotkey: 'r' } : step)) }],
    ['the watch at −51 % must not lie beyond the notice at −50 %', rules({ amplitudeWatchFallPercent: 51 })],
    ['lost under 5 % of baseline must lie beyond the notice at −96 %', rules({ amplitudeNoticeFallPercent: 96 })],
    ['Recovery margin of 10 % too wide', rules({ recoveryMarginPercent: 10 })],
  ] as const)('planProblem says: %s', (sentence, change) => {
    expect(planProblem({ ...ulnarAtElbow, ...change } as CasePlan)).toContain(sentence);
  });

  it('planProblem lets the edges pass', () => {
    for (const change of [withUlnar(moved(249)), rules({ amplitudeWatchFallPercent: 50 }), rules({ amplitudeNoticeFallPercent: 95 }), rules({ recoveryMarginPercent: 9 })]) {
      expect(planProblem({ ...ulnarAtElbow, ...change })).toBeNull();
    }
  });
});

describe('spacingProblem', () => {
  it('spacingProblem takes one site, and sites at least 1 mm apart', () => {
    expect(spacingProblem('Ulnar', [0])).toBeNull();
    expect(spacingProblem('Ulnar', [0, 1])).toBeNull();
    expect(spacingProblem('Ulnar', [0, 0.9])).toContain('too near');
    expect(spacingProblem('Ulnar', [10, 10])).toContain('out of order');
  });
});
