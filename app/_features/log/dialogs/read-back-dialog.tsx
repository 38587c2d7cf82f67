'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { Field } from '@/app/_ui/field';
import { actionNames } from '@/lib/text/action-names';

/** The message came back from the one who was told. */
export function ReadBackDialog({ alertId, onClose }: { readonly alertId: string; readonly onClose: () => void }) {
  const [words, setWords] = useState('');
  return (
    <CommandDialog
      title={actionNames.readBack}
      action={actionNames.readBack}
      command={() => ({ name: 'read-back-alert', alertId, words: words.trim() === '' ? null : words })}
      onClose={onClose}
    >
      <Field label="Words as read back" hint="May stay empty when the message came back unchanged" value={words} maxLength={300} autoComplete="off" autoFocus onChange={(event) => setWords(event.currentTarget.value)} />
    </CommandDialog>
  );
}
