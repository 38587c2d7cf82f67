import type { RuleSet } from '@/lib/alert/rule-set';

/** A named stimulation point at a position in mm along its nerve, counted from the most proximal site. */
export interface Site {
  readonly id: string;
  readonly name: string;
  readonly positionMm: number;
  readonly hotkey: string | null;
  readonly defaultIntensityMa: number;
}

/** How the amplitude of a channel is read; the two are never mixed. */
export type AmplitudeConvention = 'baseline-to-peak' | 'peak-to-peak';

/** Where a response is recorded. `positionMm` is its place along the nerve line of its nerve. */
export interface Channel {
  readonly id: string;
  readonly name: string;
  readonly longName: string;
  readonly kind: 'muscle' | 'nerve';
  readonly convention: AmplitudeConvention;
  readonly nerveId: string;
  readonly positionMm: number;
}

/** A nerve with its sites from proximal to distal. A control nerve lies outside the operation. */
export interface Nerve {
  readonly id: string;
  readonly name: string;
  readonly role: 'at-risk' | 'control';
  readonly sites: readonly Site[];
}

/** One site to one channel. Calm needs a fresh comparable run on every required path. */
export interface Path {
  readonly id: string;
  readonly nerveId: string;
  readonly siteId: string;
  readonly channelId: string;
  readonly isRequired: boolean;
}

/** A surgical step. `since` reads after "since": "nerve lifted". */
export interface StepDefinition {
  readonly id: string;
  readonly label: string;
  readonly since: string;
  readonly isRisk: boolean;
  readonly voidsDistances: boolean;
  readonly hotkey: string | null;
}

/** The electrical plan of a case: what can be stimulated, where it is recorded, what counts as a change. */
export interface NervePlan {
  readonly nerves: readonly Nerve[];
  readonly channels: readonly Channel[];
  readonly paths: readonly Path[];
  readonly steps: readonly StepDefinition[];
  readonly rules: RuleSet;
}
