import type { Channel, Site } from '@/lib/alert/nerve-plan';
import type { CaseState } from '@/lib/case/case-state';
import type { BaselineFamily } from '@/lib/case/plan';
import type { RunPurpose } from '@/lib/case/run-body';
import type { UnusableReason } from '@/lib/response/reading';

/** What is typed for one channel: as typed, also when it is wrong. Three empty fields are "not read". */
export type ChannelDraft =
  | { readonly kind: 'values'; readonly onset: string; readonly amplitude: string; readonly duration: string }
  | { readonly kind: 'absent'; readonly highest: string }
  | { readonly kind: 'unusable'; readonly reason: UnusableReason };

/** How the nerve is stimulated: what "Same settings" copies. */
export interface RunSettings {
  readonly siteId: string;
  readonly electrodeId: string;
  readonly family: BaselineFamily;
  readonly intensity: string;
  readonly pulseWidth: string;
  readonly isSupramaximal: boolean;
}

/** The next run as it stands in the form. */
export interface RunDraft {
  readonly settings: RunSettings;
  readonly purpose: RunPurpose;
  readonly channels: Readonly<Record<string, ChannelDraft>>;
  readonly note: string;
}

/** A channel nobody has looked at yet. */
export const notReadDraft: ChannelDraft = { kind: 'values', onset: '', amplitude: '', duration: '' };

/** Every site of a plan, in the order of its nerves. */
export function sitesOf(state: CaseState): readonly Site[] {
  return state.plan.nerves.flatMap((nerve) => nerve.sites);
}

/** The channels that record from a site. */
export function channelsOf(state: CaseState, siteId: string): readonly Channel[] {
  const ids = state.plan.paths.filter((path) => path.siteId === siteId).map((path) => path.channelId);
  return state.plan.channels.filter((channel) => ids.includes(channel.id));
}

/** How a site was stimulated last; before its first run, what the plan says. */
export function settingsFor(state: CaseState, siteId: string): RunSettings {
  const last = state.runs.findLast((kept) => kept.run.siteId === siteId)?.run;
  const newest = state.runs.at(-1)?.run;
  const site = sitesOf(state).find((candidate) => candidate.id === siteId);
  return {
    siteId,
    electrodeId: last?.electrodeId ?? newest?.electrodeId ?? state.plan.electrodes[0]?.id ?? '',
    family: last?.family ?? newest?.family ?? state.plan.defaultFamily,
    intensity: String(last?.intensityMa ?? site?.defaultIntensityMa ?? ''),
    pulseWidth: String(last?.pulseWidthUs ?? newest?.pulseWidthUs ?? state.plan.defaultPulseWidthUs),
    isSupramaximal: last?.isSupramaximal ?? false,
  };
}

/** What a run is made for in the present phase, unless the person says otherwise. */
export function purposeFor(state: CaseState): RunPurpose {
  return state.phase === 'baseline' || state.phase === 'set-up' ? 'baseline' : 'check';
}

/** An empty form for a site: settings as last time, nothing measured. */
export function draftFor(state: CaseState, siteId: string, purpose: RunPurpose): RunDraft {
  return { settings: settingsFor(state, siteId), purpose, channels: {}, note: '' };
}

/** True when something was typed for a channel. */
export function isTouched(channel: ChannelDraft | undefined): boolean {
  if (channel === undefined) return false;
  return channel.kind !== 'values' || channel.onset !== '' || channel.amplitude !== '' || channel.duration !== '';
}
