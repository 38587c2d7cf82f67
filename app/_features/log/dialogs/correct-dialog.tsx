'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { draftFromRun } from '@/app/_features/log/draft-from-run';
import { useLogCase } from '@/app/_features/log/log-context';
import { ReadingHeadings } from '@/app/_features/log/reading-headings';
import { ReadingRow } from '@/app/_features/log/reading-row';
import { channelsOf, notReadDraft, type RunDraft } from '@/app/_features/log/run-draft';
import { runFromDraft } from '@/app/_features/log/run-from-draft';
import { SettingsFields } from '@/app/_features/log/settings-fields';
import { Choice } from '@/app/_ui/choice';
import { Field } from '@/app/_ui/field';
import { SelectField } from '@/app/_ui/select-field';
import type { PersonCommand } from '@/lib/contracts/http/commands';
import { actionNames } from '@/lib/text/action-names';
import { clockTime } from '@/lib/text/format';
import { siteName } from '@/lib/text/site-name';

const ways = [
  { value: 'edit', label: 'Edit its values' },
  { value: 'withdraw', label: 'Withdraw it' },
] as const;

/** A run put right by an entry of its own; the original stays in the log. */
export function CorrectDialog({ firstSeq, onClose }: { readonly firstSeq: number; readonly onClose: () => void }) {
  const { state, timeZone } = useLogCase();
  const runs = [...state.runs].reverse();
  const first = runs.find((kept) => kept.seq === firstSeq) ?? runs[0];
  const [seq, setSeq] = useState(first?.seq ?? 0);
  const [way, setWay] = useState<'edit' | 'withdraw'>('edit');
  const [draft, setDraft] = useState<RunDraft | null>(() => (first === undefined ? null : draftFromRun(first.run, state.plan)));
  const [reason, setReason] = useState('');
  const choose = (chosen: number) => {
    const kept = runs.find((candidate) => candidate.seq === chosen);
    setSeq(chosen);
    if (kept !== undefined) setDraft(draftFromRun(kept.run, state.plan));
  };
  const original = runs.find((kept) => kept.seq === seq)?.run;
  const channels = draft === null ? [] : channelsOf(state, draft.settings.siteId);
  const read = draft === null ? null : runFromDraft(draft, channels);
  const sentences = read?.kind === 'wrong' ? read.sentences : {};
  const command = (): PersonCommand | string => {
    if (draft === null || read === null) return 'No run yet to correct';
    if (reason.trim() === '') return 'Reason missing: say why this run is corrected';
    if (way === 'withdraw') return { name: 'correct-run', runSeq: seq, run: null, reason };
    if (read.kind === 'nothing-read') return 'Nothing read: withdraw the run instead';
    if (read.kind === 'wrong') return 'A value cannot be read: its field says what is allowed';
    return { name: 'correct-run', runSeq: seq, run: { ...read.run, maximalResponseMa: original?.maximalResponseMa ?? null, readings: [...read.run.readings] }, reason };
  };
  return (
    <CommandDialog title={actionNames.correction} description="The original stays in the log beside its correction." action="Log correction" isWide command={command} onClose={onClose}>
      <SelectField
        label="Run"
        value={String(seq)}
        onChange={(event) => choose(Number(event.currentTarget.value))}
        options={runs.map((kept) => ({ value: String(kept.seq), label: `${clockTime(kept.at, timeZone, { seconds: true })}, ${siteName(state.plan, kept.run.siteId)}, entry ${kept.seq}` }))}
      />
      <Choice legend="How" options={ways} value={way} onChoose={setWay} />
      {way === 'edit' && draft !== null ? (
        <>
          <SettingsFields plan={state.plan} draft={draft} sentences={sentences} onDraft={setDraft} />
          <div className="overflow-x-auto">
            <ReadingHeadings channels={channels} hasPreview={false} />
            {channels.map((channel) => (
              <ReadingRow
                key={channel.id}
                channel={channel}
                typed={draft.channels[channel.id] ?? notReadDraft}
                intensity={draft.settings.intensity}
                sentences={sentences}
                preview={null}
                onType={(typed) => setDraft({ ...draft, channels: { ...draft.channels, [channel.id]: typed } })}
              />
            ))}
          </div>
        </>
      ) : null}
      <Field label="Reason" value={reason} maxLength={200} autoComplete="off" onChange={(event) => setReason(event.currentTarget.value)} />
    </CommandDialog>
  );
}
