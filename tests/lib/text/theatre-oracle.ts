/*
 * What the theatre screen may say, computed a second time from what was done, without the product's own arithmetic.
 * It knows one nerve whose sites answer in muscles of their own, so that no stretch is compared, a baseline of three equal
 * runs a site (scatter 3 %), and the default limits. Written from the rules in words:
 *
 * - a run is past a limit when its response is lost (under 5 %), fell by 50 % beyond noise (both grave), or came 10 % and
 *   0.3 ms later beyond noise (a notice at most); beyond noise is more than twice the standard error;
 * - the first such run opens a notice; a grave run on a grave notice makes it an alert; a grave notice that none of its
 *   sites was tested again for becomes an alert after 30 s (lost) or 90 s; a grave run on a lesser notice asks anew;
 * - a notice goes when every site that was past a limit is back at 55 % or more, and at +5 % or less where it was late;
 * - an alert goes only when a person ends it;
 * - calm needs every site compared after the last risk step and at most 5 minutes ago, its newest run comparable, nothing
 *   open, nothing fallen by 30 %, the cuff down and monitoring not paused.
 */

/** A response of one site: share of its baseline amplitude and ms later than its baseline onset. */
export interface OracleResponse {
  readonly share: number;
  readonly laterMs: number;
}

/** What was done. */
export type Deed =
  | { readonly kind: 'run'; readonly site: number; readonly response: OracleResponse | 'absent' | 'not-comparable' | 'not-read' }
  | { readonly kind: 'risk-step' | 'plain-step' | 'cuff-up' | 'cuff-down' | 'pause' | 'resume' | 'end-alert' | 'wait' };

interface Seen {
  readonly atMs: number;
  readonly percent: number;
  readonly laterPercent: number;
  readonly isLost: boolean;
  readonly isFallen: boolean;
  readonly isLate: boolean;
  readonly isWatched: boolean;
}

const tenth = (value: number) => Math.round(value * 10) / 10;
/** Three baseline runs: √(1 + 1/3). */
const factor = Math.sqrt(4 / 3);
const noisePercent = (percent: number) => 2 * tenth(percent * 0.03 * factor);
const noiseMs = 2 * 0.05 * factor;

/** Follows one nerve deed by deed. */
export class TheatreOracle {
  level: 'none' | 'notice' | 'alert' = 'none';
  isCuffUp = false;
  isPaused = false;
  private readonly seen: (Seen | null)[];
  private readonly isNewestComparable: boolean[];
  private lastRiskMs = -Infinity;
  private dueMs = Infinity;
  private isGrave = false;
  private isRepeated = false;
  private wasLate = false;
  private badSites = new Set<number>();
  private namedSites = new Set<number>();
  private sinceFirst = new Map<number, Seen>();

  constructor(private readonly onsetsMs: readonly number[]) {
    this.seen = onsetsMs.map(() => null);
    this.isNewestComparable = onsetsMs.map(() => true);
  }

  /** Time passes: a grave notice that was not repeated becomes an alert. */
  tick(nowMs: number): void {
    if (this.level === 'notice' && nowMs >= this.dueMs) this.level = 'alert';
  }

  take(deed: Deed, atMs: number): void {
    if (deed.kind === 'risk-step') this.lastRiskMs = atMs;
    if (deed.kind === 'cuff-up' || deed.kind === 'cuff-down') this.isCuffUp = deed.kind === 'cuff-up';
    if (deed.kind === 'pause' || deed.kind === 'resume') this.isPaused = deed.kind === 'pause';
    if (deed.kind === 'end-alert') this.level = 'none';
    if (deed.kind !== 'run' || deed.response === 'not-read') return;
    this.isNewestComparable[deed.site] = deed.response !== 'not-comparable';
    if (deed.response !== 'not-comparable') this.judge(deed.site, this.read(deed.site, deed.response, atMs));
  }

  isCalmAllowed(nowMs: number): boolean {
    const isEarned = this.seen.every(
      (one) => one !== null && one.atMs > this.lastRiskMs && nowMs - one.atMs <= 300_000 && !one.isWatched && !isBad(one),
    );
    return isEarned && this.level === 'none' && !this.isCuffUp && !this.isPaused && this.isNewestComparable.every(Boolean);
  }

  private read(site: number, response: OracleResponse | 'absent', atMs: number): Seen {
    const percent = response === 'absent' ? 0 : tenth(100 * response.share);
    const laterMs = response === 'absent' ? 0 : response.laterMs;
    const laterPercent = tenth((100 * laterMs) / this.onsetsMs[site]!);
    const isLost = percent < 5;
    const isBeyond = 100 - percent > noisePercent(percent);
    const isLate = !isLost && laterPercent >= 10 && laterMs >= 0.3 && laterMs > noiseMs;
    const isFallen = !isLost && isBeyond && percent <= 50;
    return { atMs, percent, laterPercent, isLost, isFallen, isLate, isWatched: !isLost && !isFallen && isBeyond && percent <= 70 };
  }

  private judge(site: number, seen: Seen): void {
    this.seen[site] = seen;
    if (this.level === 'none') {
      if (!isBad(seen)) return;
      Object.assign(this, { level: 'notice', isRepeated: false, badSites: new Set(), namedSites: new Set(), sinceFirst: new Map() });
      this.ask(site, seen);
      return;
    }
    this.sinceFirst.set(site, seen);
    if (isBad(seen)) this.again(site, seen);
    else if (this.level === 'notice' && this.isSettled()) this.level = 'none';
    if (this.namedSites.has(site) && !this.isAsking) this.dueMs = Infinity;
    this.isAsking = false;
  }

  private isAsking = false;

  private ask(site: number, seen: Seen): void {
    this.badSites.add(site);
    this.namedSites.add(site);
    this.isGrave = seen.isLost || seen.isFallen;
    this.wasLate = seen.isLate;
    this.dueMs = this.isGrave ? seen.atMs + (seen.isLost ? 30_000 : 90_000) : Infinity;
  }

  private again(site: number, seen: Seen): void {
    this.badSites.add(site);
    if (!seen.isLost && !seen.isFallen) return;
    if (!this.isGrave) {
      this.ask(site, seen);
      this.isAsking = true;
    } else if (!this.isRepeated) Object.assign(this, { level: 'alert', isRepeated: true, dueMs: Infinity });
  }

  private isSettled(): boolean {
    const isBack = (site: number) => {
      const newest = this.sinceFirst.get(site);
      return newest !== undefined && !isBad(newest) && newest.percent >= 55 && (!this.wasLate || newest.laterPercent <= 5);
    };
    return [...this.badSites].every(isBack) && ![...this.sinceFirst.values()].some(isBad);
  }
}

function isBad(seen: Seen): boolean {
  return seen.isLost || seen.isFallen || seen.isLate;
}
