'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { useAlertHeadline } from '@/app/_features/log/use-alert-headline';
import { Choice } from '@/app/_ui/choice';
import { TextArea } from '@/app/_ui/text-area';
import { actionNames } from '@/lib/text/action-names';
import { sayThis } from '@/lib/text/say-this';

const people = [
  { value: 'surgeon', label: 'Surgeon' },
  { value: 'anaesthetist', label: 'Anaesthetist' },
  { value: 'physician', label: 'Physician' },
] as const;
const ways = [
  { value: 'aloud', label: 'Aloud' },
  { value: 'telephone', label: 'Telephone' },
  { value: 'message', label: 'Message' },
] as const;

/** Who was told, how, in which words; the words stand ready, Enter confirms them. */
export function ToldDialog({ alertId, onClose }: { readonly alertId: string; readonly onClose: () => void }) {
  const headline = useAlertHeadline(alertId);
  const { state } = useLogCase();
  const incident = Object.values(state.incidents).find((open) => open.alertId === alertId);
  const [words, setWords] = useState(() => (incident === undefined ? '' : sayThis(state, incident)));
  const [whom, setWhom] = useState<(typeof people)[number]['value']>('surgeon');
  const [how, setHow] = useState<(typeof ways)[number]['value']>('aloud');
  return (
    <CommandDialog
      title={actionNames.told}
      description={headline}
      action={actionNames.told}
      command={() => (words.trim() === '' ? 'Words missing: log what was said' : { name: 'tell-alert', alertId, whom, how, words })}
      onClose={onClose}
    >
      <TextArea label="Words as said" value={words} maxLength={300} autoFocus onChange={(event) => setWords(event.currentTarget.value)} />
      <Choice legend="Whom" options={people} value={whom} onChoose={setWhom} />
      <Choice legend="How" options={ways} value={how} onChoose={setHow} />
    </CommandDialog>
  );
}
