'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { emptyExamination, examinationCommand, findingOptions, gradeOptions, type ExaminationDraft, type ExaminedRow } from '@/app/_features/log/examination-draft';
import { useLogCase } from '@/app/_features/log/log-context';
import { Choice } from '@/app/_ui/choice';
import { Field } from '@/app/_ui/field';
import { SelectField } from '@/app/_ui/select-field';
import { actionNames } from '@/lib/text/action-names';

const times = [
  { value: 'before-operation', label: 'Before the operation' },
  { value: 'after-operation', label: 'After the operation' },
] as const;

/** Strength by muscle and sensation by area, so that a new deficit can be told from an old one. */
export function ExaminationDialog({ onClose }: { readonly onClose: () => void }) {
  const { state } = useLogCase();
  const [draft, setDraft] = useState<ExaminationDraft>(() => emptyExamination(state.plan, state.phase === 'take-down' ? 'after-operation' : 'before-operation'));
  const set = (change: Partial<ExaminationDraft>) => setDraft((now) => ({ ...now, ...change }));
  return (
    <CommandDialog
      title={actionNames.examination}
      description="Grades of the Medical Research Council, 0 to 5. What was not examined stays so."
      action="Log examination"
      isWide
      command={() => examinationCommand(draft)}
      onClose={onClose}
    >
      <div className="flex flex-wrap items-end gap-4">
        <Choice legend="When" options={times} value={draft.when} onChoose={(when) => set({ when })} />
        <Field label="Examined by, as a role" value={draft.examinedBy} maxLength={60} autoComplete="off" className="min-w-56 flex-1" onChange={(event) => set({ examinedBy: event.currentTarget.value })} />
      </div>
      <div className="grid gap-x-8 gap-y-4 md:grid-cols-2">
        <Rows legend="Strength" free="Other muscle" rows={draft.muscles} options={gradeOptions} onChange={(muscles) => set({ muscles })} />
        <Rows legend="Sensation" free="Other area" rows={draft.areas} options={findingOptions} onChange={(areas) => set({ areas })} />
      </div>
      <Field label="Text, may stay empty" value={draft.text} maxLength={500} autoComplete="off" onChange={(event) => set({ text: event.currentTarget.value })} />
    </CommandDialog>
  );
}

interface RowsProps {
  readonly legend: string;
  readonly free: string;
  readonly rows: readonly ExaminedRow[];
  readonly options: readonly { readonly value: string; readonly label: string }[];
  readonly onChange: (rows: readonly ExaminedRow[]) => void;
}

/** Named rows, and a last one whose name is written; once it is used the next free one follows. */
function Rows({ legend, free, rows, options, onChange }: RowsProps) {
  const [namedCount] = useState(rows.length - 1);
  const change = (index: number, part: Partial<ExaminedRow>) => {
    const changed = rows.map((row, at) => (at === index ? { ...row, ...part } : row));
    const last = changed.at(-1);
    onChange(last !== undefined && last.name !== '' && last.finding !== '' && changed.length < 24 ? [...changed, { name: '', finding: '' }] : changed);
  };
  return (
    <fieldset className="flex flex-col gap-2">
      <legend className="mb-1 font-bold">{legend}</legend>
      {rows.map((row, index) =>
        index < namedCount ? (
          <SelectField key={index} label={row.name} value={row.finding} options={options} onChange={(event) => change(index, { finding: event.currentTarget.value })} />
        ) : (
          <div key={index} className="grid grid-cols-2 gap-2">
            <Field label={`${free} ${index - namedCount + 1}`} value={row.name} maxLength={60} autoComplete="off" onChange={(event) => change(index, { name: event.currentTarget.value })} />
            <SelectField label={`Finding of ${free.toLowerCase()} ${index - namedCount + 1}`} value={row.finding} options={options} onChange={(event) => change(index, { finding: event.currentTarget.value })} />
          </div>
        ),
      )}
    </fieldset>
  );
}
