'use client';

import { useState } from 'react';

import { dueTasks } from '@/app/_features/log/due-tasks';
import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { useNow } from '@/app/_live/use-now';
import { Field } from '@/app/_ui/field';
import { actionNames } from '@/lib/text/action-names';

/** Closing ends the wall and takes no more entries; what is still due is named first. */
export function CloseDialog({ onClose }: { readonly onClose: () => void }) {
  const { state } = useLogCase();
  const nowMs = useNow(1000);
  const [text, setText] = useState('');
  const tasks = dueTasks(state, nowMs);
  return (
    <CommandDialog
      title={actionNames.closeCase}
      description="A closed case takes no more entries. Every wall of it says that it is closed and not monitored."
      action={actionNames.closeCase}
      isHeavy
      command={() => ({ name: 'close-case', text: text.trim() === '' ? null : text })}
      onClose={onClose}
    >
      {tasks.length > 0 ? <p className="border-l-4 border-ink pl-3">{`Still due: ${tasks.map((task) => `${task.label}, ${task.when}`).join('; ')}`}</p> : null}
      <Field label="Note" hint="May stay empty" value={text} maxLength={300} autoComplete="off" autoFocus onChange={(event) => setText(event.currentTarget.value)} />
    </CommandDialog>
  );
}
