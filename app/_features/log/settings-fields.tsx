'use client';

import { NumericInput } from '@/app/_features/log/numeric-input';
import type { RunDraft, RunSettings } from '@/app/_features/log/run-draft';
import type { FieldSentences } from '@/app/_features/log/run-from-draft';
import { SelectField } from '@/app/_ui/select-field';
import type { BaselineFamily, CasePlan } from '@/lib/case/plan';
import type { RunPurpose } from '@/lib/case/run-body';

const families: readonly { readonly value: BaselineFamily; readonly label: string }[] = [
  { value: 'pre-position', label: 'Before positioning' },
  { value: 'through-skin', label: 'Through the skin' },
  { value: 'exposed', label: 'Exposed nerve' },
];
const purposes: readonly { readonly value: RunPurpose; readonly label: string }[] = [
  { value: 'baseline', label: 'Baseline' },
  { value: 'check', label: 'Check' },
  { value: 'closing', label: 'Closing' },
];

interface SettingsFieldsProps {
  readonly plan: CasePlan;
  readonly draft: RunDraft;
  readonly sentences: FieldSentences;
  readonly onDraft: (draft: RunDraft) => void;
}

/** Current, pulse width, electrode, family, purpose, and whether the current is known to be supramaximal. */
export function SettingsFields({ plan, draft, sentences, onDraft }: SettingsFieldsProps) {
  const { settings } = draft;
  const set = (change: Partial<RunSettings>) => onDraft({ ...draft, settings: { ...settings, ...change } });
  return (
    <div className="flex flex-wrap items-start gap-2.5">
      <NumericInput className="w-29" label="Intensity" isLabelShown name="intensity" unit="mA" value={settings.intensity} error={sentences['intensity']} onType={(intensity) => set({ intensity })} />
      <NumericInput className="w-29" label="Pulse width" isLabelShown name="pulseWidth" unit="µs" value={settings.pulseWidth} error={sentences['pulseWidth']} onType={(pulseWidth) => set({ pulseWidth })} />
      <SelectField
        label="Electrode"
        className="max-w-64 min-w-44 flex-1"
        value={settings.electrodeId}
        onChange={(event) => set({ electrodeId: event.currentTarget.value })}
        options={plan.electrodes.map((electrode) => ({ value: electrode.id, label: electrode.name }))}
      />
      <SelectField className="max-w-52 min-w-44 flex-1" label="Family" value={settings.family} onChange={(event) => set({ family: event.currentTarget.value as BaselineFamily })} options={families} />
      <SelectField className="w-30" label="Purpose" value={draft.purpose} onChange={(event) => onDraft({ ...draft, purpose: event.currentTarget.value as RunPurpose })} options={purposes} />
      <label className="mt-5.5 flex min-h-9 items-center gap-2">
        <input type="checkbox" checked={settings.isSupramaximal} onChange={(event) => set({ isSupramaximal: event.currentTarget.checked })} className="size-4 accent-stain" />
        Supramaximal
      </label>
    </div>
  );
}
