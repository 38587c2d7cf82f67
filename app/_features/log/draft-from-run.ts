import type { ChannelDraft, RunDraft } from '@/app/_features/log/run-draft';
import { shownAmplitude } from '@/app/_features/log/run-from-draft';
import type { CasePlan } from '@/lib/case/plan';
import type { RunBody } from '@/lib/case/run-body';
import type { Reading } from '@/lib/response/reading';
import { roundTo } from '@/lib/units/round-to';

const finest = 1e-6;

/** A logged run as the form shows it, to be corrected. */
export function draftFromRun(run: RunBody, plan: CasePlan): RunDraft {
  const channels = run.readings.map(({ channelId, reading }) => {
    const factor = shownAmplitude(plan.channels.find((channel) => channel.id === channelId) ?? { kind: 'muscle' }).factor;
    return [channelId, channelDraft(reading, factor)] as const;
  });
  return {
    settings: {
      siteId: run.siteId,
      electrodeId: run.electrodeId,
      family: run.family,
      intensity: String(run.intensityMa),
      pulseWidth: String(run.pulseWidthUs),
      isSupramaximal: run.isSupramaximal,
    },
    purpose: run.purpose,
    channels: Object.fromEntries(channels),
    note: run.note ?? '',
  };
}

function channelDraft(reading: Reading, factor: number): ChannelDraft {
  const typed = (value: number | null) => (value === null ? '' : String(value));
  switch (reading.kind) {
    case 'measured': {
      const amplitude = reading.amplitudeUv === null ? '' : String(roundTo(reading.amplitudeUv / factor, finest));
      return { kind: 'values', onset: typed(reading.onsetMs), amplitude, duration: typed(reading.durationMs) };
    }
    case 'absent':
      return { kind: 'absent', highest: String(reading.highestIntensityMa) };
    case 'unusable':
      return { kind: 'unusable', reason: reading.reason };
    case 'not-read':
      return { kind: 'values', onset: '', amplitude: '', duration: '' };
  }
}
