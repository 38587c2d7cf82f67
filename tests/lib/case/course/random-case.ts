import fc from 'fast-check';

import { absent, type CaseBuilder } from '@/tests/support/case-builder';
import { adm, apb, monitoredUlnar, ulnarSites } from '@/tests/support/ulnar-case';

/** One thing that happens in a case of chance, after some time; `lateS` dates it back. */
const happening = fc.record({
  waitS: fc.integer({ min: 1, max: 200 }),
  lateS: fc.oneof({ weight: 4, arbitrary: fc.constant(0) }, fc.integer({ min: 1, max: 300 })),
  act: fc.oneof(
    { weight: 6, arbitrary: fc.record({ kind: fc.constant('run' as const), site: fc.constantFrom(...ulnarSites), share: fc.constantFrom(0, 0.3, 0.45, 0.7, 1), isWeak: fc.boolean() }) },
    fc.record({ kind: fc.constant('control' as const), share: fc.constantFrom(0, 1) }),
    fc.record({ kind: fc.constant('step' as const), stepId: fc.constantFrom('nerve-lifted', 'incision', 'retractor-placed') }),
    fc.record({ kind: fc.constant('phase' as const), phase: fc.constantFrom('monitoring' as const, 'paused' as const, 'baseline' as const) }),
    fc.record({ kind: fc.constantFrom('tell' as const, 'read-back' as const, 'act' as const, 'end' as const, 'timers' as const) }),
  ),
});

type Happening = typeof happening extends fc.Arbitrary<infer T> ? T : never;

/** A monitored ulnar case in which up to 25 things happen by chance, late ones among them. */
export const randomCase: fc.Arbitrary<CaseBuilder> = fc.array(happening, { minLength: 1, maxLength: 25 }).map((happenings) => {
  const script = monitoredUlnar();
  for (const one of happenings) play(script.wait(one.waitS * 1000), one);
  script.wait(60_000).give({ name: 'change-phase', phase: 'take-down', reason: null });
  return script;
});

function play(script: CaseBuilder, { act, lateS }: Happening): void {
  const options = { eventAt: new Date(script.nowMs - lateS * 1000).toISOString() };
  const alertId = Object.values(script.state.incidents)[0]?.alertId;
  switch (act.kind) {
    case 'run': {
      const reading = act.share === 0 ? absent(20) : adm(act.site, act.share);
      script.run(act.site, { adm: reading }, act.isWeak ? { intensityMa: 5, isSupramaximal: false } : {}, options);
      return;
    }
    case 'control':
      script.run('median-wrist', { apb: act.share === 0 ? absent(20) : apb() }, {}, options);
      return;
    case 'step':
      script.step(act.stepId, options);
      return;
    case 'phase':
      if (act.phase !== script.state.phase) script.give({ name: 'change-phase', phase: act.phase, reason: 'By chance' });
      return;
    case 'timers':
      script.timers();
      return;
    default:
      if (alertId !== undefined) handle(script, act.kind, alertId, options);
  }
}

function handle(script: CaseBuilder, kind: 'tell' | 'read-back' | 'act' | 'end', alertId: string, options: { eventAt: string }): void {
  const isTold = Object.values(script.state.incidents).some((incident) => incident.alertId === alertId && incident.toldAt !== null);
  if (kind === 'tell') script.give({ name: 'tell-alert', alertId, whom: 'Surgeon', how: 'Aloud', words: 'Ulnar changed' }, options);
  if (kind === 'read-back' && isTold) script.give({ name: 'read-back-alert', alertId, words: null }, options);
  if (kind === 'act') script.give({ name: 'act-on-alert', alertId, action: 'Traction released' }, options);
  if (kind === 'end') script.give({ name: 'end-alert', alertId, outcome: 'partial', cause: 'surgical', text: null }, options);
}
