import { sciaticAtHip } from '@/lib/reference/templates/sciatic-at-hip';
import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import type { CasePlan } from '@/lib/case/plan';
import { send } from '@/tests/server/house/client';
import { connectViewer, type Viewer } from '@/tests/server/house/viewer';
import { demoSession } from '@/tests/support/demo-session';
import { HttpDesk } from '@/tests/support/http-desk';
import { adm, apb } from '@/tests/support/ulnar-case';

type Served = Readonly<{ url: string; port: number }>;

/** Plans a case in whose team the demo physician is. */
export async function planFollowed(product: Served, plan: CasePlan): Promise<HttpDesk> {
  const cookie = await demoSession(product, 'physician@demo.example');
  const { body } = await send(product, 'GET', '/api/session', { cookie });
  return HttpDesk.plan(product, plan, 'desk@demo.example', [{ personId: (body as { personId: string }).personId, role: 'physician' }]);
}

/** A desk that is connected to a case until it is closed. */
export async function beConnected(product: Served, http: HttpDesk): Promise<Viewer> {
  const viewer = await connectViewer(product, { cookie: http.cookie, viewer: 'desk' });
  await viewer.follow(http.caseId);
  return viewer;
}

/** An ulnar case in which all is tested after the nerve was lifted; its baseline is accepted by the physician. */
export async function stableCase(product: Served, change: Partial<CasePlan> = {}): Promise<HttpDesk> {
  const http = await planFollowed(product, { ...ulnarAtElbow, theatre: 'Theatre 2', side: 'right', title: 'Right ulnar nerve, transposition', ...change });
  await http.openForBaseline({ agoS: 3000 });
  await http.ulnarBaseline({ agoS: 2400 });
  await acceptAsPhysician(http);
  await http.step('nerve-lifted', { agoS: 200 });
  await retest(http, 40);
  return http;
}

/** Every ulnar site and the control, inside their limits, so long ago. */
export async function retest(http: HttpDesk, agoS: number): Promise<void> {
  await http.testUlnar(0.98, { agoS });
  await http.run('median-wrist', { apb: apb(0.99) }, {}, { agoS });
}

/** The physician accepts the baseline that the desk accepted last. */
export async function acceptAsPhysician(http: HttpDesk): Promise<void> {
  const { body } = await http.ask('GET', '/entries?after=0&limit=500');
  const accepted = (body as { entries: { kind: string; seq: number }[] }).entries.filter(({ kind }) => kind === 'baseline.accepted').at(-1);
  const physician = await http.as('physician@demo.example');
  await physician.give({ name: 'confirm-baseline', baselineSeq: accepted?.seq ?? 0, text: null });
}

/** An ulnar case with an alert between above and below elbow that nobody was told of yet. */
export async function alertCase(product: Served): Promise<HttpDesk> {
  const http = await stableCase(product, { theatre: 'Theatre 3', side: 'left', title: 'Left ulnar nerve, transposition' });
  await http.step('nerve-lifted', { agoS: 30 });
  await loseAtElbow(http);
  return http;
}

/** A fall to 38 % above the elbow and 36 % at the axilla, the response below the elbow and at the wrist kept. */
export async function loseAtElbow(http: HttpDesk): Promise<void> {
  await http.run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) }, {}, { agoS: 12 });
  await http.run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) }, {}, { agoS: 9 });
  await http.run('axilla', { adm: adm('axilla', 0.36, 1.38) }, {}, { agoS: 6 });
  await http.run('below-elbow', { adm: adm('below-elbow', 0.98, 0.01) }, {}, { agoS: 3 });
  await http.run('wrist', { adm: adm('wrist', 0.99) });
}

/** A case at the hip whose tests are all older than its last risk step. Its baseline waits for the physician. */
export async function untestedCase(product: Served): Promise<HttpDesk> {
  const http = await planFollowed(product, { ...sciaticAtHip, theatre: 'Theatre 1', side: 'right', title: 'Right hip replacement, sciatic nerve' });
  await http.openForBaseline({ agoS: 3000 });
  await runSciatic(http, 'baseline', 2400);
  await runSciatic(http, 'baseline', 2350);
  await runSciatic(http, 'baseline', 2300);
  await http.give({ name: 'accept-baseline', family: sciaticAtHip.defaultFamily, electrodeId: sciaticAtHip.electrodes[0]?.id ?? '', reason: 'Train-of-four follows' }, { agoS: 2000 });
  await http.give({ name: 'change-phase', phase: 'monitoring', reason: null }, { agoS: 1900 });
  await runSciatic(http, 'check', 400);
  await http.step('reduction', { agoS: 120 });
  return http;
}

const sciaticOnsets: Readonly<Record<string, number>> = { 'fibular-above-field': 14.9, 'fibular-below-field': 12.6, 'fibular-head': 6.2, 'tibial-above-field': 14.1, 'tibial-below-field': 11.8, 'popliteal-fossa': 6.0 };

async function runSciatic(http: HttpDesk, purpose: 'baseline' | 'check', agoS: number): Promise<void> {
  for (const [siteId, onsetMs] of Object.entries(sciaticOnsets)) {
    const channelId = sciaticAtHip.paths.find((path) => path.siteId === siteId && path.isRequired)?.channelId ?? '';
    await http.run(siteId, { [channelId]: { kind: 'measured', onsetMs, amplitudeUv: 7000, durationMs: null } }, { purpose }, { agoS });
  }
}
