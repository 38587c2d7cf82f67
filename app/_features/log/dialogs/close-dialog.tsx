'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { EndFirstDialog } from '@/app/_features/log/dialogs/end-first-dialog';
import { dueTasks } from '@/app/_features/log/due-tasks';
import { useLogCase } from '@/app/_features/log/log-context';
import { useNow } from '@/app/_live/use-now';
import { Field } from '@/app/_ui/field';
import { actionNames } from '@/lib/text/action-names';
import { incidentHeadline } from '@/lib/text/incident-headline';
import { incidentsInOrder } from '@/lib/text/incidents-in-order';

/** Closing ends the wall and takes no more entries. An open alert is ended first; an open notice is ticked; what is due is named. */
export function CloseDialog({ onClose }: { readonly onClose: () => void }) {
  const { state } = useLogCase();
  const nowMs = useNow(1000);
  const [text, setText] = useState('');
  const [isTicked, setIsTicked] = useState(false);
  const open = incidentsInOrder(state);
  if (open.some((incident) => incident.level === 'alert')) return <EndFirstDialog onClose={onClose} />;
  const tasks = dueTasks(state, nowMs);
  const notices = open.map((incident) => incidentHeadline(state, incident)).join('; ');
  return (
    <CommandDialog
      title={actionNames.closeCase}
      description="A closed case takes no more entries. Every wall of it says that it is closed and not monitored."
      action={actionNames.closeCase}
      isHeavy
      command={() => (notices !== '' && !isTicked ? `Notice open: ${notices}. Tick that the case is closed all the same, or leave` : { name: 'close-case', text: text.trim() === '' ? null : text })}
      onClose={onClose}
    >
      {notices === '' ? null : (
        <label className="flex items-start gap-3 border-l-4 border-ink pl-3 font-semibold">
          <input type="checkbox" checked={isTicked} onChange={(event) => setIsTicked(event.currentTarget.checked)} className="mt-1 size-4 shrink-0 accent-stain" />
          {`Notice open: ${notices}. Close the case all the same`}
        </label>
      )}
      {tasks.length > 0 ? <p className="border-l-4 border-ink pl-3">{`Still due: ${tasks.map((task) => `${task.label}, ${task.when}`).join('; ')}`}</p> : null}
      <Field label="Note" hint="May stay empty" value={text} maxLength={300} autoComplete="off" autoFocus onChange={(event) => setText(event.currentTarget.value)} />
    </CommandDialog>
  );
}
