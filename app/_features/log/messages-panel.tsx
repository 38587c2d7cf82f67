'use client';

import { useState, type FormEvent } from 'react';

import { useLogCase } from '@/app/_features/log/log-context';
import { Panel } from '@/app/_features/log/panel';
import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';
import { clockTime } from '@/lib/text/format';

const shownMessages = 3;

/** The last messages of the case, and a line to write one. */
export function MessagesPanel() {
  const { state, entries, timeZone, give } = useLogCase();
  const [text, setText] = useState('');
  const [problem, setProblem] = useState<string | null>(null);
  const messages = entries.filter((entry) => entry.kind === 'message.sent').slice(-shownMessages);
  const handleSubmit = async (event: FormEvent) => {
    event.preventDefault();
    if (text.trim() === '') return;
    setText('');
    const outcome = await give({ name: 'send-message', text });
    if (outcome.kind !== 'refused') return setProblem(null);
    setText(text);
    setProblem(outcome.message);
  };
  return (
    <Panel title="Messages">
      {messages.length === 0 ? <p className="mb-2 text-second">Messages with the physician stand here</p> : null}
      <ul className="mb-2 flex flex-col gap-1">
        {messages.map((entry) => (
          <li key={entry.seq}>
            <span className="font-mono text-sm text-second">{clockTime(entry.eventAt, timeZone)}</span> <b>{entry.author.displayName}</b> {String(entry.body?.['text'] ?? '')}
          </li>
        ))}
      </ul>
      {state.status === 'open' ? (
        <form method="post" onSubmit={(event) => void handleSubmit(event)} className="flex items-start gap-2">
          <Field label="Message" isLabelHidden hotkey="M" data-message="yes" autoComplete="off" maxLength={500} value={text} onChange={(event) => setText(event.currentTarget.value)} error={problem} className="flex-1" />
          <Button type="submit">Send</Button>
        </form>
      ) : null}
    </Panel>
  );
}
