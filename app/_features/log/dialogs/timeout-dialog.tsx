'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { Choice } from '@/app/_ui/choice';
import { Field } from '@/app/_ui/field';
import { actionNames } from '@/lib/text/action-names';

const sides = [
  { value: 'left', label: 'Left' },
  { value: 'right', label: 'Right' },
] as const;

/** Patient and side, said aloud by the team. The side is chosen anew: it is never filled in from the plan. */
export function TimeoutDialog({ onClose }: { readonly onClose: () => void }) {
  const { head } = useLogCase();
  const [side, setSide] = useState<'left' | 'right' | null>(null);
  const [text, setText] = useState('');
  const patient = [head.patientLabel, head.recordNumber].filter((part) => part !== null).join(', ');
  return (
    <CommandDialog
      title={actionNames.timeout}
      description={`Runs before it are set-up runs and never a baseline.${patient === '' ? '' : ` Planned for ${patient}.`}`}
      action="Confirm patient and side"
      command={() => (side === null ? 'Side missing: choose the side that the team said' : { name: 'confirm-timeout', side, text: text.trim() === '' ? null : text })}
      onClose={onClose}
    >
      <Choice legend="Side as said by the team" options={sides} value={side} onChoose={setSide} />
      <Field label="Note" hint="May stay empty" value={text} maxLength={200} autoComplete="off" onChange={(event) => setText(event.currentTarget.value)} />
    </CommandDialog>
  );
}
