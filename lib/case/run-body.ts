import type { BaselineFamily } from '@/lib/case/plan';
import type { ChannelReading } from '@/lib/response/reading';

/** What a run is made for. */
export type RunPurpose = 'baseline' | 'check' | 'closing';

/** One stimulation at one site with the responses on its channels. */
export interface RunBody {
  readonly siteId: string;
  readonly electrodeId: string;
  readonly family: BaselineFamily;
  readonly purpose: RunPurpose;
  readonly intensityMa: number;
  readonly pulseWidthUs: number;
  readonly isSupramaximal: boolean;
  readonly maximalResponseMa: number | null;
  readonly readings: readonly ChannelReading[];
  readonly note: string | null;
}
