import type { Condition } from '@/lib/case/entry-bodies';
import type { CasePlan } from '@/lib/case/plan';
import type { RunPurpose } from '@/lib/case/run-body';
import type { ChannelReading } from '@/lib/response/reading';
import { healthy, type ModelNerve, type NerveCondition } from '@/server/demo/nerve-model';
import { readResponse } from '@/server/demo/read-response';
import type { DemoAuthor, DemoCommand, Moment } from '@/server/demo/scenario';
import { SpokenPercents } from '@/server/demo/spoken-percents';

/** How a site is stimulated. */
export interface SiteStimulus {
  readonly electrodeId: string;
  readonly family: CasePlan['defaultFamily'];
  readonly intensityMa: number;
  readonly pulseWidthUs: number;
  readonly thresholdMa: number;
  readonly maximalMa: number;
}

/** What a run may say besides its site. */
export interface RunOptions {
  readonly after?: number;
  readonly purpose?: RunPurpose;
  readonly note?: string;
}

/** Usual waits at speed 1, in seconds (house rule). */
const usualSeconds = { run: 9, act: 8, words: 12, firstBaselineRun: 10, nextBaselineRun: 5 } as const;

/** Writes a scenario act by act. What acts on the nerves is set as the story goes, and every reading follows from it. */
export class ScenarioScript {
  readonly moments: Moment[] = [];
  /** What acts on every nerve now, and on single nerves besides. */
  acting: NerveCondition = healthy;
  readonly actingOn: Record<string, Partial<NerveCondition>> = {};
  readonly stimuli: Record<string, SiteStimulus>;
  readonly positionsMm: Record<string, number>;
  /** Seconds since the beginning, at speed 1. */
  atSeconds = 0;
  private heading: string | null = null;
  private readingCount = 0;
  private readonly spoken = new SpokenPercents();

  constructor(
    readonly plan: CasePlan,
    private readonly nerves: readonly ModelNerve[],
    stimuli: Readonly<Record<string, SiteStimulus>>,
  ) {
    this.stimuli = { ...stimuli };
    this.positionsMm = Object.fromEntries(plan.nerves.flatMap((nerve) => nerve.sites.map((site) => [site.id, site.positionMm])));
  }

  /** Names the part that begins now. */
  part(heading: string): void {
    this.heading = heading;
  }

  give(command: DemoCommand, { after = usualSeconds.act, by = 'desk' }: { after?: number; by?: DemoAuthor } = {}): void {
    this.atSeconds += after;
    this.moments.push({ afterSeconds: after, by, command, heading: this.heading });
    this.heading = null;
  }

  message(by: DemoAuthor, text: string, after: number = usualSeconds.words): void {
    this.give({ name: 'send-message', text }, { by, after });
  }

  /** Advice of the physician, and the desk that confirms it. */
  advice(text: string, answer: string): void {
    this.give({ name: 'give-advice', text }, { by: 'physician', after: usualSeconds.words });
    this.give({ name: 'confirm-advice', text: answer });
  }

  condition(condition: Condition, reportedBy: string | null = null, after: number = usualSeconds.act): void {
    this.give({ name: 'log-condition', condition, reportedBy }, { after });
  }

  step(stepId: string, after: number = usualSeconds.act): void {
    this.give({ name: 'log-step', stepId, label: null }, { after });
  }

  phase(phase: 'baseline' | 'monitoring' | 'take-down'): void {
    this.give({ name: 'change-phase', phase, reason: null });
  }

  /** One run at a site, as the nerve answers when it is given. */
  run(siteId: string, { after = usualSeconds.run, purpose = 'check', note }: RunOptions = {}): void {
    const { electrodeId, family, intensityMa, pulseWidthUs, maximalMa } = this.stimulusOf(siteId);
    const readings = this.readings(siteId);
    this.spoken.keep(siteId, purpose, readings);
    const supramaximal = { isSupramaximal: intensityMa >= 1.2 * maximalMa, maximalResponseMa: maximalMa };
    const run = { siteId, electrodeId, family, purpose, intensityMa, pulseWidthUs, ...supramaximal, readings, note: note ?? null };
    this.give({ name: 'log-run', run }, { after });
  }

  /** Each site once, in the order given. */
  runs(siteIds: readonly string[], options: RunOptions = {}): void {
    for (const siteId of siteIds) this.run(siteId, options);
  }

  /** Three baseline runs at each site, the note on the first of them. */
  baselineRuns(siteIds: readonly string[], note?: string): void {
    for (const siteId of siteIds) {
      this.run(siteId, { after: usualSeconds.firstBaselineRun, purpose: 'baseline', ...(note === undefined ? {} : { note }) });
      for (let count = 1; count < 3; count += 1) this.run(siteId, { after: usualSeconds.nextBaselineRun, purpose: 'baseline' });
    }
  }

  /** The desk accepts what was run with this electrode, and the physician accepts it too. */
  acceptBaseline(electrodeId: string, family: CasePlan['defaultFamily'], words: string, reason: string | null = null): void {
    this.give({ name: 'accept-baseline', electrodeId, family, reason });
    this.give({ name: 'confirm-baseline', text: words }, { by: 'physician', after: usualSeconds.words });
  }

  /** "93 %": the newest response in whole percent of its working or opening baseline, as a person says it. */
  percent(siteId: string, channelId: string, of: 'working' | 'opening' = 'working'): string {
    return this.spoken.percent(`${siteId}/${channelId}`, of);
  }

  private stimulusOf(siteId: string): SiteStimulus {
    const stimulus = this.stimuli[siteId];
    if (stimulus === undefined) throw new Error(`The scenario has no stimulus for the site ${siteId}.`);
    return stimulus;
  }

  private readings(siteId: string): readonly ChannelReading[] {
    const planned = this.plan.nerves.find((nerve) => nerve.sites.some((site) => site.id === siteId));
    const nerve = this.nerves.find((candidate) => candidate.id === planned?.id);
    if (nerve === undefined) throw new Error(`The scenario has no nerve for the site ${siteId}.`);
    const channelIds = this.plan.paths.filter((path) => path.siteId === siteId).map((path) => path.channelId);
    const stimulus = { ...this.stimulusOf(siteId), positionMm: this.positionsMm[siteId] ?? 0 };
    const acting = { ...this.acting, ...this.actingOn[nerve.id] };
    return nerve.outlets
      .filter(({ channelId }) => channelIds.includes(channelId))
      .map((outlet) => ({ channelId: outlet.channelId, reading: readResponse(nerve, outlet, stimulus, acting, (this.readingCount += 1)) }));
  }
}
