import type { CasePlan } from '@/lib/case/plan';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import type { Reading } from '@/lib/response/reading';
import { CaseBuilder, measured, type Readings } from '@/tests/support/case-builder';

/**
 * Baseline of the invented arm, ADM, ms and µV. Segments: 150 mm / 2.46 ms = 61.0 m/s, 100 mm / 1.85 ms = 54.1 m/s,
 * 210 mm / 3.56 ms = 59.0 m/s.
 */
export const ulnarBaseline = {
  axilla: { onsetMs: 10.77, amplitudeUv: 8600 },
  'above-elbow': { onsetMs: 8.31, amplitudeUv: 8900 },
  'below-elbow': { onsetMs: 6.46, amplitudeUv: 9200 },
  wrist: { onsetMs: 2.9, amplitudeUv: 9400 },
} as const;

/** A site of the ulnar nerve. */
export type UlnarSite = keyof typeof ulnarBaseline;
/** The sites from proximal to distal. */
export const ulnarSites: readonly UlnarSite[] = ['axilla', 'above-elbow', 'below-elbow', 'wrist'];
/** FDI answers 0.27 ms later than ADM and a tenth larger. */
const fdi = { laterMs: 0.27, factor: 1.1 };
/** Control: median nerve at the wrist to APB. */
export const medianBaseline = { onsetMs: 3.3, amplitudeUv: 11_000 } as const;

/** A response at a share of the baseline's amplitude, later by some ms. */
export function adm(site: UlnarSite, share = 1, laterMs = 0): Reading {
  const { onsetMs, amplitudeUv } = ulnarBaseline[site];
  return measured(onsetMs + laterMs, amplitudeUv * share);
}

/** The same site seen from FDI. */
export function fdiAt(site: UlnarSite, share = 1, laterMs = 0): Reading {
  const { onsetMs, amplitudeUv } = ulnarBaseline[site];
  return measured(onsetMs + fdi.laterMs + laterMs, amplitudeUv * fdi.factor * share);
}

/** The control at a share of its baseline. */
export function apb(share = 1): Reading {
  return measured(medianBaseline.onsetMs, medianBaseline.amplitudeUv * share);
}

/** A case that is open with its time-out done, at 10:00; no run yet. */
export function openedCase(plan: CasePlan = ulnarAtElbow): CaseBuilder {
  const script = new CaseBuilder(plan);
  script.give({ name: 'plan-case', plan, reference: 'K7-0001', identityCommitment: 'c'.repeat(64) });
  script.give({ name: 'open-case', clockOffsetMs: 0 });
  script.give({ name: 'confirm-timeout', side: plan.side, text: null });
  return script;
}

/** What a baseline run of a site shows on the channels asked for. */
function baselineReadings(site: UlnarSite, channels: readonly string[]): Readings {
  return Object.fromEntries(channels.map((channel) => [channel, channel === 'fdi' ? fdiAt(site) : adm(site)]));
}

/**
 * The ulnar case at 10:30, monitoring: baselines of three equal runs a site accepted at 10:10 (scatter at its floor of
 * 3 %), every site compared once at 10:30 and inside its limits. Channels ADM and FDI, or ADM alone; control APB.
 */
export function monitoredUlnar(channels: readonly string[] = ['adm']): CaseBuilder {
  const script = openedCase().at('10:05');
  script.give({ name: 'change-phase', phase: 'baseline', reason: null });
  for (const site of ulnarSites) {
    for (let count = 0; count < 3; count += 1) script.wait(1000).run(site, baselineReadings(site, channels), { purpose: 'baseline' });
  }
  for (let count = 0; count < 3; count += 1) script.wait(1000).run('median-wrist', { apb: apb() }, { purpose: 'baseline' });
  script.at('10:10').give({ name: 'log-condition', condition: { kind: 'train-of-four', count: 4, ratio: null }, reportedBy: null });
  script.give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: null });
  script.give({ name: 'change-phase', phase: 'monitoring', reason: null });
  script.at('10:30');
  testAll(script, channels);
  script.wait(1000).run('median-wrist', { apb: apb() });
  return script;
}

/** Every ulnar site tested once, one second apart, each at the same share of baseline. */
export function testAll(script: CaseBuilder, channels: readonly string[] = ['adm'], share = 1): void {
  for (const site of ulnarSites) {
    const readings = channels.map((channel) => [channel, channel === 'fdi' ? fdiAt(site, share) : adm(site, share)] as const);
    script.wait(1000).run(site, Object.fromEntries(readings));
  }
}
