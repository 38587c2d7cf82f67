'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { Field } from '@/app/_ui/field';
import { otherStepId } from '@/lib/case/decide/decide-step';

/** A step that the plan did not foresee, in the person's words. */
export function OtherStepDialog({ onClose }: { readonly onClose: () => void }) {
  const [label, setLabel] = useState('');
  return (
    <CommandDialog
      title="Other step"
      description="Counts as a risk step: every path is to be tested again after it."
      action="Log step"
      command={() => (label.trim() === '' ? 'Name missing: say what was done, in a few words' : { name: 'log-step', stepId: otherStepId, label: label.trim() })}
      onClose={onClose}
    >
      <Field label="Step" value={label} maxLength={40} autoComplete="off" autoFocus onChange={(event) => setLabel(event.currentTarget.value)} />
    </CommandDialog>
  );
}
