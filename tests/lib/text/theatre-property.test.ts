import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import type { CasePlan } from '@/lib/case/plan';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { absent, measured, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, monitoredUlnar, openedCase, ulnarBaseline, ulnarSites, type UlnarSite } from '@/tests/support/ulnar-case';
import { TheatreOracle, type Deed, type OracleResponse } from '@/tests/lib/text/theatre-oracle';

/** The ulnar case with a muscle of its own for each of three sites: no stretch between two sites is compared. */
const sites: readonly UlnarSite[] = ['axilla', 'above-elbow', 'wrist'];
const muscles = ['fcu', 'adm', 'fdi'];
const plan: CasePlan = {
  ...ulnarAtElbow,
  channels: [...ulnarAtElbow.channels, { ...ulnarAtElbow.channels[0]!, id: 'fcu', name: 'FCU', longName: 'Flexor carpi ulnaris' }],
  paths: sites.map((siteId, index) => ({ id: `${siteId}/${muscles[index]}`, nerveId: 'ulnar', siteId, channelId: muscles[index]!, isRequired: true })),
};

const share = fc.oneof(
  { weight: 6, arbitrary: fc.constantFrom(1, 0.97, 1.2) },
  { weight: 3, arbitrary: fc.constantFrom(0.701, 0.7, 0.6, 0.55, 0.549, 0.501) },
  { weight: 3, arbitrary: fc.constantFrom(0.5, 0.38, 0.05, 0.049) },
);
const laterMs = fc.oneof({ weight: 5, arbitrary: fc.constant(0) }, { weight: 1, arbitrary: fc.constantFrom(0.1, 0.145, 0.2, 0.289, 0.3, 0.8, 1.1) });
const response: fc.Arbitrary<OracleResponse | 'absent' | 'not-comparable' | 'not-read'> = fc.oneof(
  { weight: 12, arbitrary: fc.record({ share, laterMs }) },
  { weight: 1, arbitrary: fc.constantFrom('absent' as const, 'not-comparable' as const, 'not-read' as const) },
);
const deed: fc.Arbitrary<Deed> = fc.oneof(
  { weight: 12, arbitrary: fc.record({ kind: fc.constant('run' as const), site: fc.integer({ min: 0, max: 2 }), response }) },
  { weight: 2, arbitrary: fc.record({ kind: fc.constantFrom('risk-step' as const, 'plain-step' as const, 'end-alert' as const, 'wait' as const) }) },
  { weight: 1, arbitrary: fc.record({ kind: fc.constantFrom('cuff-up' as const, 'cuff-down' as const, 'pause' as const, 'resume' as const) }) },
);
const gapMs = fc.oneof({ weight: 8, arbitrary: fc.integer({ min: 1, max: 20_000 }) }, { weight: 1, arbitrary: fc.constantFrom(29_999, 30_000, 89_999, 90_000, 290_000, 300_001) });

/** More cases in the exhaustive form of the tests. */
const effort = process.env['FASCICLE_TEST_FULL'] === '1' ? 20 : 1;

const opening = begun();
const monitored = monitoredUlnar();

function begun(): CaseBuilder {
  const script = openedCase(plan).at('10:05');
  sites.forEach((site, index) => {
    const { onsetMs, amplitudeUv } = ulnarBaseline[site];
    for (let count = 0; count < 3; count += 1) script.wait(1000).run(site, { [muscles[index]!]: measured(onsetMs, amplitudeUv) }, { purpose: 'baseline' });
  });
  script.give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Train-of-four follows' });
  script.give({ name: 'change-phase', phase: 'monitoring', reason: null });
  return script;
}

function play(script: CaseBuilder, one: Deed): void {
  switch (one.kind) {
    case 'run': {
      const site = sites[one.site]!;
      const { onsetMs, amplitudeUv } = ulnarBaseline[site];
      const channel = muscles[one.site]!;
      if (one.response === 'absent') script.run(site, { [channel]: absent(20) });
      else if (one.response === 'not-read') script.run(site, { [channel]: { kind: 'not-read' } });
      else if (one.response === 'not-comparable') script.run(site, { [channel]: measured(onsetMs, amplitudeUv * 0.2) }, { pulseWidthUs: 500 });
      else script.run(site, { [channel]: measured(onsetMs + one.response.laterMs, amplitudeUv * one.response.share) });
      return;
    }
    case 'risk-step':
      return script.step('nerve-lifted');
    case 'plain-step':
      return script.step('incision');
    case 'cuff-up':
    case 'cuff-down':
      script.give({ name: 'log-condition', condition: { kind: 'tourniquet', isUp: one.kind === 'cuff-up', pressureMmHg: null }, reportedBy: null });
      return;
    case 'pause':
    case 'resume': {
      const phase = one.kind === 'pause' ? 'paused' : 'monitoring';
      if (script.state.phase !== phase) script.give({ name: 'change-phase', phase, reason: 'X-ray' });
      return;
    }
    case 'end-alert': {
      const incident = script.state.incidents['ulnar'];
      if (incident !== undefined) script.give({ name: 'end-alert', alertId: incident.alertId, outcome: 'none', cause: 'undetermined', text: null });
      return;
    }
    case 'wait':
  }
}

function saidOf(script: CaseBuilder): 'none' | 'notice' | 'alert' {
  const { lead, others } = script.view();
  const kinds = [lead, ...others].map((line) => line.kind);
  if (kinds.includes('alert') || kinds.includes('recovered')) return 'alert';
  return kinds.includes('notice') ? 'notice' : 'none';
}

describe('theatreView against a second computation', () => {
  it('theatreView is calm exactly when calm was earned, and says notice and alert exactly when one is open', () => {
    const reached = new Set<string>();
    fc.assert(
      fc.property(fc.array(fc.tuple(gapMs, deed), { minLength: 5, maxLength: 40 }), (deeds) => {
        const script = opening.fork();
        const oracle = new TheatreOracle(sites.map((site) => ulnarBaseline[site].onsetMs));
        for (const [gap, one] of deeds) {
          script.wait(gap);
          oracle.tick(script.nowMs);
          script.timers();
          oracle.take(one, script.nowMs);
          play(script, one);
          expect(saidOf(script)).toBe(oracle.level);
          expect(script.view().lead.isCalm).toBe(oracle.isCalmAllowed(script.nowMs));
          reached.add(script.view().lead.kind);
        }
      }),
      { numRuns: 120 * effort },
    );
    // The draw reaches every state that this plan can show; else the agreement above would say little.
    expect([...reached].sort()).toEqual(
      ['alert', 'improved', 'not-compared', 'not-tested', 'notice', 'paused', 'recovered', 'stable', 'tourniquet-up', 'watch'],
    );
  });

  it('theatreView agrees with the second computation only because both are right: a wrong limit is found', () => {
    // The control: a share of 51 % given as 49 % to the second computation alone must break the agreement.
    const script = opening.fork();
    const oracle = new TheatreOracle(sites.map((site) => ulnarBaseline[site].onsetMs));
    play(script, { kind: 'run', site: 0, response: { share: 0.51, laterMs: 0 } });
    oracle.take({ kind: 'run', site: 0, response: { share: 0.49, laterMs: 0 } }, script.nowMs);
    expect(saidOf(script)).not.toBe(oracle.level);
  });
});

describe('theatreView without an injury', () => {
  it('theatreView stays stable with amplitudes within 5 % and latencies within 0.05 ms, tested in time', () => {
    const jitter = fc.record({ share: fc.double({ min: 0.95, max: 1.05, noNaN: true }), laterMs: fc.double({ min: -0.05, max: 0.05, noNaN: true }) });
    const round = fc.tuple(jitter, jitter, jitter, jitter);
    fc.assert(
      fc.property(fc.array(round, { minLength: 1, maxLength: 6 }), (rounds) => {
        const script = monitored.fork();
        for (const responses of rounds) {
          script.wait(60_000);
          responses.forEach((one, index) => script.wait(15_000).run(ulnarSites[index]!, { adm: adm(ulnarSites[index]!, one.share, one.laterMs) }));
          expect(script.timers()).toEqual([]);
          expect(script.state.incidents).toEqual({});
          expect(script.view().lead.kind).toBe('stable');
        }
      }),
      { numRuns: 40 * effort },
    );
  });

  it('theatreView is never calm within a nerve whose newest pair of runs shows a fifth less ratio or a slower stretch', () => {
    const one = fc.record({ site: fc.integer({ min: 0, max: 3 }), share: fc.double({ min: 0.6, max: 1.3, noNaN: true }), laterMs: fc.double({ min: -0.2, max: 1, noNaN: true }) });
    fc.assert(
      fc.property(fc.array(one, { minLength: 1, maxLength: 12 }), (runs) => {
        const script = monitored.fork();
        const newest = ulnarSites.map(() => ({ share: 1, laterMs: 0 }));
        for (const { site, share: kept, laterMs: later } of runs) {
          script.wait(2000).run(ulnarSites[site]!, { adm: adm(ulnarSites[site]!, kept, later) });
          newest[site] = { share: kept, laterMs: later };
        }
        // Well past the limits, so that rounding and noise (under 5 points, under 0.2 ms) decide nothing.
        const isClear = newest.some(({ share: kept, laterMs: later }, index) => {
          const distal = newest[index + 1];
          if (distal === undefined) return false;
          const baseMs = ulnarBaseline[ulnarSites[index]!].onsetMs - ulnarBaseline[ulnarSites[index + 1]!].onsetMs;
          // A ratio that is low only because the distal response grew is a gain: 8 points are clear of the proximal noise.
          return (kept / distal.share < 0.78 && kept < 0.92) || later - distal.laterMs > Math.max(0.45, 0.25 * baseMs);
        });
        fc.pre(isClear);
        expect(script.view().lead.isCalm).toBe(false);
      }),
      { numRuns: 60 * effort },
    );
  });
});
