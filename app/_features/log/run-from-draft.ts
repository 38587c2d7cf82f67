import { isTouched, notReadDraft, type ChannelDraft, type RunDraft } from '@/app/_features/log/run-draft';
import { readNumber, type ShownUnit } from '@/app/_features/log/read-number';
import type { Channel } from '@/lib/alert/nerve-plan';
import type { RunBody } from '@/lib/case/run-body';
import type { Reading } from '@/lib/response/reading';
import type { BoundedQuantity } from '@/lib/units/bounds';

/** Sentences by field: "intensity", "adm.onset". Empty when everything can be read. */
export type FieldSentences = Readonly<Record<string, string>>;

/** The run that a form stands for, or what keeps it from being one. */
export type DraftRun =
  | { readonly kind: 'run'; readonly run: RunBody }
  | { readonly kind: 'nothing-read' }
  | { readonly kind: 'wrong'; readonly sentences: FieldSentences };

/** mV for a muscle, µV for a nerve; the case keeps µV. */
export function shownAmplitude(channel: Pick<Channel, 'kind'>): ShownUnit {
  return channel.kind === 'muscle' ? { unit: 'mV', factor: 1000 } : { unit: 'µV', factor: 1 };
}

/** Reads a form. Numbers are kept as typed; `decide` rounds them once. */
export function runFromDraft(draft: RunDraft, channels: readonly Channel[]): DraftRun {
  const sentences: Record<string, string> = {};
  const read = (field: string, typed: string, quantity: BoundedQuantity, shown?: ShownUnit): number | null => {
    const number = readNumber(typed, quantity, shown);
    if (number.kind === 'wrong') sentences[field] = number.sentence;
    return number.kind === 'read' ? number.value : null;
  };
  const need = (field: string, typed: string, quantity: BoundedQuantity, noun: string): number => {
    if (typed.trim() === '') sentences[field] = `${noun} is empty: type the value that was used`;
    return read(field, typed, quantity) ?? 0;
  };
  const intensityMa = need('intensity', draft.settings.intensity, 'intensityMa', 'Intensity');
  const pulseWidthUs = need('pulseWidth', draft.settings.pulseWidth, 'pulseWidthUs', 'Pulse width');
  const readings = channels.map((channel) => ({
    channelId: channel.id,
    reading: readingOf(draft.channels[channel.id] ?? notReadDraft, channel, read, need, sentences),
  }));
  for (const { channelId, reading } of readings) {
    if (reading.kind !== 'absent' || reading.highestIntensityMa >= intensityMa || Object.keys(sentences).length > 0) continue;
    sentences[`${channelId}.highest`] = `${reading.highestIntensityMa} mA is under this run’s ${intensityMa} mA: type the highest current that was tried`;
  }
  if (Object.keys(sentences).length > 0) return { kind: 'wrong', sentences };
  if (!channels.some((channel) => isTouched(draft.channels[channel.id]))) return { kind: 'nothing-read' };
  const { siteId, electrodeId, family, isSupramaximal } = draft.settings;
  const note = draft.note.trim() === '' ? null : draft.note.trim();
  const stimulus = { siteId, electrodeId, family, purpose: draft.purpose, intensityMa, pulseWidthUs, isSupramaximal, maximalResponseMa: null };
  return { kind: 'run', run: { ...stimulus, readings, note } };
}

type Read = (field: string, typed: string, quantity: BoundedQuantity, shown?: ShownUnit) => number | null;
type Need = (field: string, typed: string, quantity: BoundedQuantity, noun: string) => number;

function readingOf(typed: ChannelDraft, channel: Channel, read: Read, need: Need, sentences: Record<string, string>): Reading {
  switch (typed.kind) {
    case 'absent':
      return { kind: 'absent', highestIntensityMa: need(`${channel.id}.highest`, typed.highest, 'intensityMa', 'Highest current tried') };
    case 'unusable':
      return { kind: 'unusable', reason: typed.reason };
    case 'values': {
      if (!isTouched(typed)) return { kind: 'not-read' };
      const onsetMs = read(`${channel.id}.onset`, typed.onset, 'onsetMs');
      const amplitudeUv = read(`${channel.id}.amplitude`, typed.amplitude, 'amplitudeUv', shownAmplitude(channel));
      const durationMs = read(`${channel.id}.duration`, typed.duration, 'durationMs');
      if (onsetMs === null && amplitudeUv === null && typed.onset.trim() === '' && typed.amplitude.trim() === '') {
        sentences[`${channel.id}.onset`] = `${channel.name}: a negative peak alone is no reading. Type onset or amplitude, or clear it`;
      }
      return { kind: 'measured', onsetMs, amplitudeUv, durationMs };
    }
  }
}
