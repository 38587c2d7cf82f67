'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useAlertHeadline } from '@/app/_features/log/use-alert-headline';
import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';
import { actionNames } from '@/lib/text/action-names';

/** Actions of the trade, to be chosen or overwritten. Common practice. */
const usualActions = ['Traction released', 'Retractor moved', 'Loop loosened', 'Limb moved', 'Cuff let down', 'Pressure raised', 'Field warmed', 'Waiting', 'None'];

/** What the surgeon did, as seen or said. The program states it; it never asks for one. */
export function ActionDialog({ alertId, onClose }: { readonly alertId: string; readonly onClose: () => void }) {
  const headline = useAlertHeadline(alertId);
  const [action, setAction] = useState('');
  return (
    <CommandDialog
      title={actionNames.acted}
      description={headline}
      action={`Log ${actionNames.acted.charAt(0).toLowerCase()}${actionNames.acted.slice(1)}`}
      command={() => (action.trim() === '' ? 'Action missing: log what was done, or None' : { name: 'act-on-alert', alertId, action })}
      onClose={onClose}
    >
      <Field label="What was done" value={action} maxLength={200} autoComplete="off" autoFocus onChange={(event) => setAction(event.currentTarget.value)} />
      <div className="flex flex-wrap gap-2">
        {usualActions.map((usual) => <Button key={usual} onClick={() => setAction(usual)}>{usual}</Button>)}
      </div>
    </CommandDialog>
  );
}
