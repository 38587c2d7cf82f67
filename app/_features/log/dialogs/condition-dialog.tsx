'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { conditionFrom, emptyConditionDraft, type ConditionDraft } from '@/app/_features/log/condition-draft';
import type { ConditionKind } from '@/app/_features/log/log-dialog';
import { NumericInput } from '@/app/_features/log/numeric-input';
import { Choice } from '@/app/_ui/choice';
import { Field } from '@/app/_ui/field';

const kinds: readonly { readonly value: ConditionKind; readonly label: string }[] = [
  { value: 'train-of-four', label: 'Train-of-four' },
  { value: 'tourniquet', label: 'Tourniquet' },
  { value: 'limb-temperature', label: 'Limb skin' },
  { value: 'core-temperature', label: 'Core' },
  { value: 'mean-pressure', label: 'Mean pressure' },
  { value: 'relaxant', label: 'Relaxant' },
  { value: 'local-anaesthetic', label: 'Local anaesthetic' },
  { value: 'other', label: 'Other' },
];
const cuff = [
  { value: 'up', label: 'Up' },
  { value: 'down', label: 'Down' },
] as const;

/** A condition as measured or as reported. */
export function ConditionDialog({ first, onClose }: { readonly first: ConditionKind; readonly onClose: () => void }) {
  const [draft, setDraft] = useState<ConditionDraft>({ ...emptyConditionDraft, kind: first });
  const set = (change: Partial<ConditionDraft>) => setDraft((now) => ({ ...now, ...change }));
  return (
    <CommandDialog
      title="Condition"
      action="Log condition"
      command={() => {
        const condition = conditionFrom(draft);
        if (typeof condition === 'string') return condition;
        return { name: 'log-condition', condition, reportedBy: draft.reportedBy.trim() === '' ? null : draft.reportedBy };
      }}
      onClose={onClose}
    >
      <Choice legend="What" options={kinds} value={draft.kind} onChoose={(kind) => setDraft({ ...emptyConditionDraft, kind })} />
      <ConditionFields draft={draft} set={set} />
      <Field label="As reported by" hint="May stay empty when you measured it" value={draft.reportedBy} maxLength={60} autoComplete="off" onChange={(event) => set({ reportedBy: event.currentTarget.value })} />
    </CommandDialog>
  );
}

function ConditionFields({ draft, set }: { readonly draft: ConditionDraft; readonly set: (change: Partial<ConditionDraft>) => void }) {
  const text = (label: string) => <Field label={label} value={draft.text} maxLength={120} autoComplete="off" onChange={(event) => set({ text: event.currentTarget.value })} />;
  const number = (label: string, unit?: string) => (
    <NumericInput label={label} isLabelShown name="number" {...(unit === undefined ? {} : { unit })} value={draft.number} onType={(typed) => set({ number: typed })} className="w-44" />
  );
  switch (draft.kind) {
    case 'train-of-four':
      return (
        <div className="flex gap-3">
          {number('Count of 4')}
          <NumericInput label="Ratio, may stay empty" isLabelShown name="ratio" value={draft.ratio} onType={(ratio) => set({ ratio })} className="w-44" />
        </div>
      );
    case 'tourniquet':
      return (
        <div className="flex flex-wrap items-end gap-4">
          <Choice legend="Cuff" options={cuff} value={draft.cuff} onChoose={(state) => set({ cuff: state })} />
          {number('Pressure, may stay empty', 'mmHg')}
        </div>
      );
    case 'limb-temperature':
    case 'core-temperature':
      return number('Temperature', '°C');
    case 'mean-pressure':
      return number('Mean pressure', 'mmHg');
    case 'relaxant':
      return text('Relaxant, dose and time as reported');
    case 'local-anaesthetic':
      return text('Drug, place and time as reported');
    case 'other':
      return text('What');
  }
}
