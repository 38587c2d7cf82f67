import { v7 as newId } from 'uuid';

import type { CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import type { PersonCommand, PlanCaseRequest } from '@/lib/contracts/http/commands';
import type { CommandReply, WireEntry } from '@/lib/contracts/http/replies';
import type { Reading } from '@/lib/response/reading';
import { send, type HttpAnswer } from '@/tests/server/house/client';
import { demoSession } from '@/tests/support/demo-session';
import { adm, apb, ulnarSites, type UlnarSite } from '@/tests/support/ulnar-case';

type Run = PersonCommand & { name: 'log-run' };
/** Seconds before now at which something happened; an entry may come late. */
export type Ago = Readonly<{ agoS?: number }>;

/** Cases are planned so long ago: nothing can have happened in a case before. */
const plannedAgoMs = 2 * 3_600_000;

/** A desk without a screen: gives commands over HTTP, as the product's own pages do. */
export class HttpDesk {
  private constructor(
    private readonly product: { readonly url: string },
    readonly cookie: string,
    readonly caseId: string,
    private readonly plan: CasePlan,
  ) {}

  /** Signs in and plans a case. */
  static async plan(product: { readonly url: string }, plan: CasePlan, email = 'desk@demo.example', team: PlanCaseRequest['team'] = []): Promise<HttpDesk> {
    const cookie = await demoSession(product, email);
    const body = { commandId: newId(), eventAt: new Date(Date.now() - plannedAgoMs).toISOString(), plan, ...(team.length === 0 ? {} : { team }), identity: { patientLabel: 'Invented patient', recordNumber: 'DEMO-1' } };
    const { status, body: reply } = await send(product, 'POST', '/api/cases', { cookie, body });
    if (status !== 200) throw new Error(`Planning answered ${status}: ${JSON.stringify(reply)}`);
    return new HttpDesk(product, cookie, (reply as CommandReply & { kind: 'committed' }).caseId, plan);
  }

  /** The same case in the hands of another demo person. */
  async as(email: string): Promise<HttpDesk> {
    return new HttpDesk(this.product, await demoSession(this.product, email), this.caseId, this.plan);
  }

  /** Gives a command that must be committed; the entries it wrote. */
  async give(command: PersonCommand, { agoS = 0 }: Ago = {}): Promise<readonly WireEntry[]> {
    const eventAt = new Date(Date.now() - agoS * 1000).toISOString();
    const { status, body } = await this.ask('POST', '/commands', { commandId: newId(), eventAt, command });
    if (status !== 200) throw new Error(`${command.name} answered ${status}: ${JSON.stringify(body)}`);
    return (body as CommandReply & { kind: 'committed' }).entries;
  }

  ask(method: string, path: string, body?: unknown): Promise<HttpAnswer> {
    return send(this.product, method, `/api/cases/${this.caseId}${path}`, { cookie: this.cookie, ...(body === undefined ? {} : { body }) });
  }

  /** One run at a site's usual current, known to be supramaximal. */
  run(siteId: string, readings: Readonly<Record<string, Reading>>, changes: Partial<Run['run']> = {}, ago: Ago = {}): Promise<readonly WireEntry[]> {
    const site = this.plan.nerves.flatMap((nerve) => nerve.sites).find((candidate) => candidate.id === siteId);
    const body: RunBody = {
      siteId,
      electrodeId: this.plan.electrodes[0]?.id ?? '',
      family: this.plan.defaultFamily,
      purpose: 'check',
      intensityMa: site?.defaultIntensityMa ?? 20,
      pulseWidthUs: this.plan.defaultPulseWidthUs,
      isSupramaximal: true,
      maximalResponseMa: null,
      readings: [],
      note: null,
    };
    const read = Object.entries(readings).map(([channelId, reading]) => ({ channelId, reading }));
    return this.give({ name: 'log-run', run: { ...body, readings: read, ...changes } }, ago);
  }

  /** Opens the case with its time-out and begins the baseline phase. */
  async openForBaseline(ago: Ago = {}): Promise<void> {
    await this.give({ name: 'open-case', clockOffsetMs: 0 }, ago);
    await this.give({ name: 'confirm-timeout', side: this.plan.side, text: null }, ago);
    await this.give({ name: 'change-phase', phase: 'baseline', reason: null }, ago);
  }

  /** Three baseline runs at every site of the ulnar case and of its control, accepted; monitoring begins. */
  async ulnarBaseline(ago: Ago = {}): Promise<void> {
    for (const site of ulnarSites) for (let count = 0; count < 3; count += 1) await this.run(site, { adm: adm(site) }, { purpose: 'baseline' }, ago);
    for (let count = 0; count < 3; count += 1) await this.run('median-wrist', { apb: apb() }, { purpose: 'baseline' }, ago);
    await this.give({ name: 'log-condition', condition: { kind: 'train-of-four', count: 4, ratio: 0.95 }, reportedBy: 'anaesthetist' }, ago);
    await this.give({ name: 'accept-baseline', family: 'through-skin', electrodeId: 'surface', reason: null }, ago);
    await this.give({ name: 'change-phase', phase: 'monitoring', reason: null }, ago);
  }

  /** Every ulnar site once, each at the same share of its baseline. A fall is read from distal to proximal: the other way round it begins as a proximal one. */
  async testUlnar(share = 1, ago: Ago = {}, sites: readonly UlnarSite[] = ulnarSites): Promise<void> {
    for (const site of sites) await this.run(site, { adm: adm(site, share) }, {}, ago);
  }

  step(stepId: string, ago: Ago = {}): Promise<readonly WireEntry[]> {
    return this.give({ name: 'log-step', stepId, label: null }, ago);
  }

  /** Binds the wall that shows this code to the case. */
  async pair(code: string): Promise<void> {
    for (const isConfirmed of [false, true]) {
      const { status, body } = await this.ask('POST', '/screens', { code, isConfirmed });
      if (status !== 200) throw new Error(`Pairing answered ${status}: ${JSON.stringify(body)}`);
    }
  }
}
