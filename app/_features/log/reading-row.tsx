'use client';

import { useId } from 'react';

import { AgainstBaseline, type ChannelPreview } from '@/app/_features/log/against-baseline';
import { NumericInput } from '@/app/_features/log/numeric-input';
import { isTouched, notReadDraft, type ChannelDraft } from '@/app/_features/log/run-draft';
import type { FieldSentences } from '@/app/_features/log/run-from-draft';
import { Button } from '@/app/_ui/button';
import { SelectField } from '@/app/_ui/select-field';
import type { Channel } from '@/lib/alert/nerve-plan';
import type { UnusableReason } from '@/lib/response/reading';
import { unusableWords } from '@/lib/text/reading-words';

interface ReadingRowProps {
  readonly channel: Channel;
  readonly typed: ChannelDraft;
  /** Current of the run: the highest one tried, until the person says more. */
  readonly intensity: string;
  readonly sentences: FieldSentences;
  readonly preview: ChannelPreview | null;
  readonly onType: (typed: ChannelDraft) => void;
  readonly onFocus?: () => void;
}

/** Columns of the lines of a run, and of their headings. */
export const readingColumns = 'grid grid-cols-[5.5rem_repeat(3,minmax(5.5rem,7rem))_8.5rem_minmax(9rem,1fr)] items-start gap-x-2';

const traces = [{ value: '', label: 'Usable' }, { value: 'absent', label: 'No response' }, ...Object.entries(unusableWords).map(([value, label]) => ({ value, label: `Not usable: ${label}` }))];

/** One line for one channel: what was read, or no response, or not usable; empty says "not read". */
export function ReadingRow({ channel, typed, intensity, sentences, preview, onType, onFocus }: ReadingRowProps) {
  const errorId = useId();
  const error = (field: string) => sentences[`${channel.id}.${field}`];
  const wrong = ['onset', 'amplitude', 'duration', 'highest'].map(error).filter((sentence) => sentence !== undefined);
  return (
    <div role="group" aria-label={channel.longName} data-channel={channel.id} onFocus={onFocus} className="pb-1">
      <div className={readingColumns}>
        <span className="flex min-h-9 items-center font-bold" title={channel.longName}>{channel.name}</span>
        {typed.kind === 'values' ? (
          <>
            <NumericInput label={`Onset of ${channel.name}, ms`} name={`${channel.id}.onset`} value={typed.onset} error={error('onset')} errorId={errorId} placeholder={isTouched(typed) ? '' : 'not read'} onType={(onset) => onType({ ...typed, onset })} />
            <NumericInput label={`Amplitude of ${channel.name}, ${channel.kind === 'muscle' ? 'mV' : 'µV'}`} name={`${channel.id}.amplitude`} value={typed.amplitude} error={error('amplitude')} errorId={errorId} onType={(amplitude) => onType({ ...typed, amplitude })} />
            <NumericInput label={`Negative peak of ${channel.name}, ms`} name={`${channel.id}.duration`} value={typed.duration} error={error('duration')} errorId={errorId} onType={(duration) => onType({ ...typed, duration })} />
          </>
        ) : null}
        {typed.kind === 'absent' ? (
          <div className="col-span-3 flex items-start gap-2.5">
            <span className="flex min-h-9 items-center font-semibold whitespace-nowrap">No response up to</span>
            <NumericInput label={`Highest current tried, ${channel.name}`} name={`${channel.id}.highest`} unit="mA" value={typed.highest} error={error('highest')} errorId={errorId} onType={(highest) => onType({ kind: 'absent', highest })} className="w-28" />
            <Button onClick={() => onType(notReadDraft)} aria-label={`Clear ${channel.name}`}>Clear</Button>
          </div>
        ) : null}
        {typed.kind === 'unusable' ? <span className="col-span-3 flex min-h-9 items-center font-semibold">{`Not usable, ${unusableWords[typed.reason]}`}</span> : null}
        <SelectField
          label={`Whether ${channel.name} is usable`}
          isLabelHidden
          value={typed.kind === 'unusable' ? typed.reason : typed.kind === 'absent' ? 'absent' : ''}
          disabled={typed.kind === 'values' && isTouched(typed)}
          onChange={(event) => onType(draftOf(event.currentTarget.value, intensity))}
          options={traces}
        />
        <AgainstBaseline preview={preview} />
      </div>
      {wrong.length === 0 ? null : <p id={errorId} role="alert" className="mt-1 ml-23 border-l-4 border-ink pl-2 text-sm font-semibold">{wrong.join('. ')}</p>}
    </div>
  );
}

function draftOf(trace: string, intensity: string): ChannelDraft {
  if (trace === '') return notReadDraft;
  return trace === 'absent' ? { kind: 'absent', highest: intensity } : { kind: 'unusable', reason: trace as UnusableReason };
}
