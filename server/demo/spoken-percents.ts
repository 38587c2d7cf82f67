import type { RunPurpose } from '@/lib/case/run-body';
import type { ChannelReading } from '@/lib/response/reading';

/** The amplitudes a person has in mind when a percentage is said: each baseline of a path, and its newest response. */
export class SpokenPercents {
  private readonly baselines = new Map<string, number[][]>();
  private readonly newest = new Map<string, { readonly amplitudeUv: number; readonly isBaseline: boolean }>();

  keep(siteId: string, purpose: RunPurpose, readings: readonly ChannelReading[]): void {
    for (const { channelId, reading } of readings) {
      const path = `${siteId}/${channelId}`;
      const amplitudeUv = reading.kind === 'measured' ? (reading.amplitudeUv ?? 0) : 0;
      const isBaseline = purpose === 'baseline';
      if (isBaseline) this.keepBaseline(path, amplitudeUv);
      this.newest.set(path, { amplitudeUv, isBaseline });
    }
  }

  /** "93 %" of the mean of the path's newest or first baseline. */
  percent(path: string, of: 'working' | 'opening'): string {
    const baselines = this.baselines.get(path) ?? [];
    const amplitudes = of === 'opening' ? baselines[0] : baselines.at(-1);
    const newest = this.newest.get(path);
    if (amplitudes === undefined || newest === undefined) throw new Error(`There is no baseline of ${path} to speak of.`);
    const meanUv = amplitudes.reduce((sum, amplitudeUv) => sum + amplitudeUv, 0) / amplitudes.length;
    // As the screens do: to 0.1 %, then to whole percent.
    return `${Math.round(Math.round((1000 * newest.amplitudeUv) / meanUv) / 10)} %`;
  }

  /** The first baseline run after anything else begins a new baseline. */
  private keepBaseline(path: string, amplitudeUv: number): void {
    const before = this.baselines.get(path) ?? [];
    const isNext = this.newest.get(path)?.isBaseline === true;
    const current = isNext ? [...(before.at(-1) ?? []), amplitudeUv] : [amplitudeUv];
    this.baselines.set(path, [...(isNext ? before.slice(0, -1) : before), current]);
  }
}
