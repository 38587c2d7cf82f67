import type { NervePlan } from '@/lib/alert/nerve-plan';

/** Which electrode gives the stimulus; a run is compared only with a baseline of the same one. */
export interface Electrode {
  readonly id: string;
  readonly name: string;
}

/** Baseline family: never mixed. */
export type BaselineFamily = 'pre-position' | 'through-skin' | 'exposed';

/** The whole plan of a case, copied into its first entry. Holds no identity of the patient. */
export interface CasePlan extends NervePlan {
  readonly templateId: string;
  readonly procedure: string;
  readonly title: string;
  readonly side: 'left' | 'right';
  readonly theatre: string;
  readonly electrodes: readonly Electrode[];
  readonly defaultPulseWidthUs: number;
  readonly defaultFamily: BaselineFamily;
  readonly closingSiteId: string;
  readonly trap: string;
}
