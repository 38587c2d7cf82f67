'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useAlertHeadline } from '@/app/_features/log/use-alert-headline';
import { Field } from '@/app/_ui/field';
import { actionNames } from '@/lib/text/action-names';

/** The message came back from the one who was told. */
export function ReadBackDialog({ alertId, onClose }: { readonly alertId: string; readonly onClose: () => void }) {
  const headline = useAlertHeadline(alertId);
  const [words, setWords] = useState('');
  return (
    <CommandDialog
      title={actionNames.readBack}
      description={headline}
      action={actionNames.readBack}
      command={() => ({ name: 'read-back-alert', alertId, words: words.trim() === '' ? null : words })}
      onClose={onClose}
    >
      <Field label="Words as read back" hint="May stay empty when the message came back unchanged" value={words} maxLength={300} autoComplete="off" autoFocus onChange={(event) => setWords(event.currentTarget.value)} />
    </CommandDialog>
  );
}
