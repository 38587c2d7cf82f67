'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { Choice } from '@/app/_ui/choice';
import { Field } from '@/app/_ui/field';
import type { Phase } from '@/lib/case/entry-bodies';
import { actionNames } from '@/lib/text/action-names';

const phases: readonly { readonly value: Phase; readonly label: string; readonly hint: string }[] = [
  { value: 'set-up', label: 'Set-up', hint: 'Electrodes, impedances, first responses' },
  { value: 'baseline', label: 'Baseline', hint: 'Runs to compare with' },
  { value: 'monitoring', label: 'Monitoring', hint: 'Counts as monitoring time' },
  { value: 'paused', label: 'Paused', hint: 'Needs its reason, the wall shows it' },
  { value: 'take-down', label: 'Take-down', hint: 'Monitoring is over' },
];
const nextPhase: { readonly [P in Phase]: Phase } = { 'set-up': 'baseline', baseline: 'monitoring', monitoring: 'paused', paused: 'monitoring', 'take-down': 'monitoring' };

/** The phase of the case: it decides what counts as monitoring time. */
export function PhaseDialog({ onClose }: { readonly onClose: () => void }) {
  const { state } = useLogCase();
  const [phase, setPhase] = useState<Phase>(nextPhase[state.phase]);
  const [reason, setReason] = useState('');
  return (
    <CommandDialog
      title={actionNames.phase}
      description={`Now: ${state.phase}`}
      action="Change phase"
      command={() => ({ name: 'change-phase', phase, reason: reason.trim() === '' ? null : reason })}
      onClose={onClose}
    >
      <Choice legend="Next phase" isStacked options={phases.filter((option) => option.value !== state.phase)} value={phase} onChoose={setPhase} />
      <Field label="Reason" hint={phase === 'paused' ? 'Needed for a pause' : 'May stay empty'} value={reason} maxLength={200} autoComplete="off" onChange={(event) => setReason(event.currentTarget.value)} />
    </CommandDialog>
  );
}
