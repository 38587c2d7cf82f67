import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { CaseScript } from '@/tests/support/theatre-gallery/case-script';

/** Onset in ms and amplitude in mV at ADM: 61, 54 and 59 m/s over 150, 100 and 210 mm, and 2.90 ms from the wrist. */
export const ulnarBaseline = {
  axilla: [10.77, 8.7],
  'above-elbow': [8.31, 9.0],
  'below-elbow': [6.46, 9.2],
  wrist: [2.9, 9.4],
} as const;

const currents = { axilla: 20, 'above-elbow': 18, 'below-elbow': 16, wrist: 14 } as const;

export type UlnarSite = keyof typeof ulnarBaseline;

/** From proximal to distal. */
export const ulnarSites = Object.keys(ulnarBaseline) as readonly UlnarSite[];

/** A run at a site whose response is `share` of its baseline and `laterMs` later. */
export function ulnarRun(script: CaseScript, time: string, site: UlnarSite, share: number, laterMs = 0): CaseScript {
  const [onsetMs, amplitudeMv] = ulnarBaseline[site];
  if (share === 0) return script.run(time, site, currents[site], { adm: 'absent' });
  return script.run(time, site, currents[site], { adm: [onsetMs + laterMs, amplitudeMv * share] });
}

/** The ulnar case with its plan, three baseline runs at each site and of the control, accepted, in the monitoring phase. */
export function ulnarMonitored(): CaseScript {
  const script = CaseScript.opened({ ...ulnarAtElbow, theatre: 'Theatre 3' });
  ulnarSites.forEach((site, index) => {
    const [onsetMs, amplitudeMv] = ulnarBaseline[site];
    [0.98, 1.02, 1].forEach((factor, run) =>
      script.run(`09:4${index}:${run}0`, site, currents[site], { adm: [onsetMs, amplitudeMv * factor] }, { purpose: 'baseline' }),
    );
  });
  [0.99, 1.01, 1].forEach((factor, run) => script.run(`09:45:${run}0`, 'median-wrist', 15, { apb: [3.6, 9.8 * factor] }, { purpose: 'baseline' }));
  return script
    .give('09:50:00', { name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: 'Read by the desk alone' })
    .give('09:52:00', { name: 'change-phase', phase: 'monitoring', reason: null });
}

/** All sites tested and stable after the nerve was lifted at 10:36. */
export function ulnarStable(): CaseScript {
  const script = ulnarMonitored().give('10:36:00', { name: 'log-step', stepId: 'nerve-lifted', label: null });
  ulnarRun(script, '10:37:10', 'axilla', 0.98);
  ulnarRun(script, '10:38:00', 'above-elbow', 0.97, 0.02);
  ulnarRun(script, '10:38:40', 'below-elbow', 0.98);
  ulnarRun(script, '10:39:10', 'wrist', 0.99);
  return script;
}

/** The lesion of the design's pictures: 38 % from above the elbow, 36 % from the axilla, 1.38 ms later, below it kept. */
export function ulnarAlert(): CaseScript {
  const script = ulnarStable().give('10:41:20', { name: 'log-step', stepId: 'nerve-lifted', label: null });
  ulnarRun(script, '10:41:55', 'above-elbow', 0.4, 1.33);
  ulnarRun(script, '10:42:12', 'above-elbow', 0.38, 1.38);
  ulnarRun(script, '10:42:31', 'axilla', 0.36, 1.38);
  ulnarRun(script, '10:42:49', 'below-elbow', 0.98, 0.01);
  ulnarRun(script, '10:43:01', 'wrist', 0.99);
  return script;
}
