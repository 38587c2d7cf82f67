'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useAlertHeadline } from '@/app/_features/log/use-alert-headline';
import { Choice } from '@/app/_ui/choice';
import { Field } from '@/app/_ui/field';
import { SelectField } from '@/app/_ui/select-field';
import type { AlertCause } from '@/lib/case/entry-bodies';
import { actionNames } from '@/lib/text/action-names';
import { causeNames } from '@/lib/text/alert-sentence';

const outcomes = [
  { value: 'full', label: 'Full recovery' },
  { value: 'partial', label: 'Partial recovery' },
  { value: 'none', label: 'No recovery' },
] as const;
type Outcome = (typeof outcomes)[number]['value'];

const causes = [
  { value: '', label: 'Choose' },
  ...Object.entries(causeNames).map(([value, name]) => ({ value, label: name.charAt(0).toUpperCase() + name.slice(1) })),
];

/** Only a person ends an alert: with its outcome and the judged cause. */
export function EndDialog({ alertId, onClose }: { readonly alertId: string; readonly onClose: () => void }) {
  const headline = useAlertHeadline(alertId);
  const [outcome, setOutcome] = useState<Outcome | null>(null);
  const [cause, setCause] = useState<AlertCause | ''>('');
  const [text, setText] = useState('');
  return (
    <CommandDialog
      title={`${actionNames.ended}: how it came out`}
      description={headline}
      action={actionNames.ended}
      command={() => {
        if (outcome === null) return 'Outcome missing: full, partial or no recovery';
        if (cause === '') return 'Cause missing: choose one, or undetermined';
        return { name: 'end-alert', alertId, outcome, cause, text: text.trim() === '' ? null : text };
      }}
      onClose={onClose}
    >
      <Choice legend="Outcome" options={outcomes} value={outcome} onChoose={setOutcome} />
      <SelectField label="Cause" options={causes} value={cause} onChange={(event) => setCause(event.currentTarget.value as AlertCause | '')} />
      <Field label="Note" hint="May stay empty" value={text} maxLength={300} autoComplete="off" onChange={(event) => setText(event.currentTarget.value)} />
    </CommandDialog>
  );
}
