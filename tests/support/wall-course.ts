import { absent } from '@/tests/support/case-builder';
import type { HttpDesk } from '@/tests/support/http-desk';
import { adm, apb, ulnarSites } from '@/tests/support/ulnar-case';

/** One state of the wall: how the case comes to it from the one before, and how the lead then reads. */
interface WallLeg {
  readonly name: string;
  readonly lead: RegExp;
  readonly play: (desk: HttpDesk) => Promise<unknown>;
}

const back = async (desk: HttpDesk) => {
  await desk.testUlnar(0.98, { agoS: 40 });
  await desk.run('median-wrist', { apb: apb(0.99) }, {}, { agoS: 35 });
};

/** The cuff and the pause come and go; the state before is back after them. */
const cuff = (desk: HttpDesk, isUp: boolean, agoS = 0) =>
  desk.give({ name: 'log-condition', condition: { kind: 'tourniquet', isUp, pressureMmHg: isUp ? 250 : null }, reportedBy: 'anaesthetist' }, { agoS });
const phase = (desk: HttpDesk, name: 'monitoring' | 'paused' | 'take-down', reason: string | null = null) => desk.give({ name: 'change-phase', phase: name, reason });

/** A lesion between above and below elbow: 38 % from above the elbow, 36 % from the axilla, 1.38 ms later, distal kept. */
const lesion = async (desk: HttpDesk) => {
  await desk.run('above-elbow', { adm: adm('above-elbow', 0.38, 1.38) });
  await desk.run('axilla', { adm: adm('axilla', 0.36, 1.38) });
  await desk.run('below-elbow', { adm: adm('below-elbow', 0.98, 0.01) });
  await desk.run('wrist', { adm: adm('wrist', 0.99) });
};
const twice = async (desk: HttpDesk, sites: readonly (keyof typeof lost)[]) => {
  for (const site of sites) for (let count = 0; count < 2; count += 1) await desk.run(site, lost[site], { intensityMa: 20 });
};
const lost = { axilla: { adm: absent(30) }, 'above-elbow': { adm: absent(30) }, 'below-elbow': { adm: absent(30) }, wrist: { adm: absent(30) }, 'median-wrist': { apb: absent(30) } } as const;

const end = (desk: HttpDesk, alertId: string) => desk.give({ name: 'end-alert', alertId, outcome: 'full', cause: 'surgical', text: null });

/** The states in the order in which one operation can meet them, from the planned case to the closed one. */
export const wallCourse: readonly WallLeg[] = [
  { name: 'planned', lead: /^Set-up$/, play: async () => undefined },
  { name: 'no-baseline', lead: /^Ulnar: no baseline yet$/, play: (desk) => desk.openForBaseline({ agoS: 2400 }) },
  { name: 'not-tested-since-baseline', lead: /^Not tested since baseline$/, play: (desk) => desk.ulnarBaseline({ agoS: 2100 }) },
  { name: 'stable', lead: /^Stable$/, play: async (desk) => (await desk.step('nerve-lifted', { agoS: 240 }), back(desk)) },
  { name: 'improved', lead: /^Ulnar improved, 142 % of baseline$/, play: (desk) => desk.testUlnar(1.42) },
  { name: 'watch', lead: /^Ulnar at 62 % of baseline$/, play: (desk) => desk.testUlnar(0.62, {}, [...ulnarSites].reverse()) },
  { name: 'not-compared', lead: /^Ulnar not compared since /, play: async (desk) => (await desk.testUlnar(), desk.run('above-elbow', { adm: adm('above-elbow', 0.7) }, { intensityMa: 9, isSupramaximal: false })) },
  { name: 'tourniquet-up', lead: /^Tourniquet up 2 min$/, play: async (desk) => (await desk.testUlnar(), cuff(desk, true, 125)) },
  { name: 'paused', lead: /^Paused$/, play: async (desk) => (await cuff(desk, false), phase(desk, 'paused', 'Cautery')) },
  { name: 'not-tested', lead: /^Not tested since nerve lifted$/, play: async (desk) => (await phase(desk, 'monitoring'), desk.step('nerve-lifted')) },
  { name: 'notice', lead: /^Ulnar at 40 % of baseline$/, play: (desk) => desk.run('above-elbow', { adm: adm('above-elbow', 0.4, 1.33) }) },
  { name: 'alert', lead: /^Ulnar at 36 % of baseline$/, play: lesion },
  { name: 'told', lead: /^Ulnar at 36 % of baseline$/, play: (desk) => desk.give({ name: 'tell-alert', alertId: 'ulnar-1', whom: 'surgeon', how: 'aloud', words: 'Ulnar at 36 per cent of baseline' }) },
  { name: 'recovered', lead: /^Ulnar back at 92 % of baseline$/, play: async (desk) => (await desk.testUlnar(0.92), desk.testUlnar(0.92)) },
  { name: 'lost', lead: /^No ulnar response$/, play: async (desk) => (await end(desk, 'ulnar-1'), await back(desk), await twice(desk, ['above-elbow', 'axilla']), desk.testUlnar(0.98, {}, ['below-elbow', 'wrist'])) },
  { name: 'cannot-be-judged', lead: /^No ulnar response$/, play: (desk) => twice(desk, [...ulnarSites, 'median-wrist']) },
  { name: 'take-down', lead: /^No ulnar response$/, play: (desk) => phase(desk, 'take-down') },
  { name: 'closed', lead: /^Case closed \d\d:\d\d$/, play: async (desk) => (await end(desk, 'ulnar-2'), desk.give({ name: 'close-case', text: null })) },
];
