import { shownNerves } from '@/lib/chart/shown-nerves';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import type { CasePlan } from '@/lib/case/plan';
import type { CaseState } from '@/lib/case/case-state';
import { sciaticAtHip } from '@/lib/reference/templates/sciatic-at-hip';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import type { TheatreView } from '@/lib/text/theatre-line';
import { theatreView } from '@/lib/text/theatre-view';
import { CaseScript, momentAt } from '@/tests/support/theatre-gallery/case-script';
import { ulnarAlert, ulnarMonitored, ulnarRun, ulnarSites, ulnarStable } from '@/tests/support/theatre-gallery/ulnar-case';

const timeZone = 'Europe/London';

/** What a wall shows of one case at one time. */
export interface WallState {
  readonly place: string;
  readonly procedure: string;
  readonly clock: string;
  readonly view: TheatreView;
  readonly nerves: readonly NerveLineView[];
}

function shown(state: CaseState, time: string): WallState {
  const nowMs = Date.parse(momentAt(time));
  const view = theatreView(state, nowMs, timeZone);
  return {
    place: `${state.plan.theatre}, ${state.plan.side}`,
    procedure: state.plan.procedure,
    clock: time,
    view,
    nerves: shownNerves(state, view.lead.kind, nowMs),
  };
}

function twoNerves(fibular: Readonly<Record<string, number>>, times = 1): CaseScript {
  const plan: CasePlan = { ...sciaticAtHip, theatre: 'Theatre 1', side: 'right' };
  const script = CaseScript.opened(plan);
  const onsets: Record<string, number> = { 'fibular-above-field': 14.9, 'fibular-below-field': 12.6, 'fibular-head': 6.2, 'tibial-above-field': 14.1, 'tibial-below-field': 11.8, 'popliteal-fossa': 6.0 };
  const channelOf = (siteId: string) => plan.paths.find((path) => path.siteId === siteId && path.isRequired)?.channelId ?? '';
  const runAll = (hour: string, shares: Readonly<Record<string, number>>, purpose: 'baseline' | 'check') =>
    Object.entries(onsets).forEach(([siteId, onsetMs], index) =>
      script.run(`${hour}:${String(index).padStart(2, '0')}:30`, siteId, 12, { [channelOf(siteId)]: [onsetMs, 7 * (shares[siteId] ?? 1)] }, { purpose }),
    );
  runAll('10', {}, 'baseline');
  script.give('10:20:00', { name: 'accept-baseline', family: plan.defaultFamily, electrodeId: plan.electrodes[0]?.id ?? '', reason: 'Read by the desk alone' });
  script.give('10:21:00', { name: 'change-phase', phase: 'monitoring', reason: null });
  const risk = plan.steps.find((step) => step.isRisk);
  script.give('10:59:00', { name: 'log-step', stepId: risk?.id ?? '', label: null });
  for (const hour of ['11', '12', '13'].slice(0, times)) runAll(hour, fibular, 'check');
  return script;
}

/** Each state of the theatre screen, reached by commands a desk could give. */
export const wallStates: Readonly<Record<string, () => WallState>> = {
  'set-up': () => shown(new CaseScript().give('09:00:00', { name: 'plan-case', plan: { ...ulnarAtElbow, theatre: 'Theatre 3' }, reference: 'FSC-0001-K', identityCommitment: '0'.repeat(64) }).give('09:31:00', { name: 'open-case', clockOffsetMs: 0 }).state, '09:31:40'),
  'no-baseline': () => shown(CaseScript.opened({ ...ulnarAtElbow, theatre: 'Theatre 3' }).run('09:40:00', 'wrist', 14, { adm: [2.9, 9.4] }, { purpose: 'baseline' }).state, '09:40:20'),
  stable: () => shown(ulnarStable().state, '10:39:30'),
  improved: () => {
    const script = ulnarStable();
    ulnarSites.forEach((site, index) => ulnarRun(script, `10:39:3${index}`, site, 1.42));
    return shown(script.state, '10:40:20');
  },
  watch: () => {
    const script = ulnarStable();
    // From the wrist upwards, so that no ratio of two sites falls on the way.
    [...ulnarSites].reverse().forEach((site, index) => ulnarRun(script, `10:39:3${index}`, site, 0.62));
    return shown(script.state, '10:40:20');
  },
  notice: () => {
    const script = ulnarStable().give('10:41:20', { name: 'log-step', stepId: 'nerve-lifted', label: null });
    ulnarRun(script, '10:41:55', 'above-elbow', 0.4, 1.33);
    return shown(script.state, '10:42:05');
  },
  alert: () => shown(ulnarAlert().state, '10:43:20'),
  told: () => {
    const script = ulnarAlert();
    const alertId = Object.values(script.state.incidents)[0]?.alertId ?? '';
    return shown(script.give('10:43:25', { name: 'tell-alert', alertId, whom: 'Surgeon', how: 'aloud', words: 'Ulnar at 36 per cent' }).state, '10:43:40');
  },
  lost: () => {
    const script = ulnarStable().give('10:41:20', { name: 'log-step', stepId: 'nerve-lifted', label: null });
    for (const time of ['10:41:55', '10:42:12']) ulnarRun(script, time, 'above-elbow', 0);
    ulnarRun(script, '10:42:49', 'below-elbow', 0.98);
    ulnarRun(script, '10:43:01', 'wrist', 0.99);
    return shown(script.state, '10:43:20');
  },
  recovered: () => {
    const script = ulnarAlert();
    ulnarRun(script, '10:44:10', 'above-elbow', 0.91, 0.1);
    ulnarRun(script, '10:44:30', 'above-elbow', 0.92, 0.1);
    ulnarRun(script, '10:44:50', 'axilla', 0.93, 0.1);
    ulnarRun(script, '10:45:05', 'axilla', 0.93, 0.1);
    return shown(script.state, '10:45:20');
  },
  'not-tested': () => shown(ulnarStable().give('10:41:20', { name: 'log-step', stepId: 'nerve-lifted', label: null }).state, '10:41:50'),
  'not-compared': () => shown(ulnarStable().run('10:40:00', 'above-elbow', 9, { adm: [8.4, 6.1] }, { isSupramaximal: false }).state, '10:40:20'),
  'tourniquet-up': () => shown(ulnarStable().give('10:39:20', { name: 'log-condition', condition: { kind: 'tourniquet', isUp: true, pressureMmHg: 250 }, reportedBy: 'anaesthetist' }).state, '10:40:50'),
  paused: () => shown(ulnarMonitored().give('10:20:00', { name: 'change-phase', phase: 'paused', reason: 'Cautery' }).state, '10:24:00'),
  'take-down': () => shown(ulnarStable().give('11:40:00', { name: 'change-phase', phase: 'take-down', reason: null }).state, '11:41:00'),
  closed: () => shown(ulnarStable().give('11:40:00', { name: 'change-phase', phase: 'take-down', reason: null }).give('11:58:00', { name: 'close-case', text: null }).state, '11:58:20'),
  'take-down-alert': () => shown(ulnarAlert().give('10:50:00', { name: 'change-phase', phase: 'take-down', reason: null }).state, '10:51:00'),
  'amplitude-alone': () => {
    const script = ulnarStable();
    for (const time of ['10:39:40', '10:39:55']) ulnarRun(script, time, 'above-elbow', 0.4);
    ulnarRun(script, '10:40:00', 'axilla', 0.39);
    ulnarRun(script, '10:40:05', 'below-elbow', 0.98);
    ulnarRun(script, '10:40:15', 'wrist', 0.99);
    return shown(script.state, '10:40:20');
  },
  'not-tested-long': () => shown(ulnarStable().state, '11:52:00'),
  'cannot-be-judged': () => {
    const script = ulnarStable();
    ulnarSites.forEach((site, index) => ulnarRun(script, `10:41:0${index}`, site, 0).run(`10:41:2${index}`, site, 30, { adm: 'absent' }));
    script.run('10:41:40', 'median-wrist', 15, { apb: 'absent' });
    for (const alert of Object.values(script.state.incidents)) script.give('10:41:50', { name: 'end-alert', alertId: alert.alertId, outcome: 'none', cause: 'technical', text: null });
    return shown(script.state, '10:42:05');
  },
  'two-nerves': () => shown(twoNerves({ 'fibular-above-field': 0.66, 'fibular-below-field': 0.66, 'fibular-head': 0.66 }).state, '11:05:50'),
  'two-nerves-alert': () => shown(twoNerves({ 'fibular-above-field': 0.33 }, 2).state, '12:05:50'),
};
