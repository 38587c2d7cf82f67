'use client';

import { useRef, type FormEvent, type KeyboardEvent } from 'react';

import { useLogCase } from '@/app/_features/log/log-context';
import { QuestionStrip } from '@/app/_features/log/question-strip';
import { ReadingRow, readingColumns } from '@/app/_features/log/reading-row';
import { isTouched, notReadDraft } from '@/app/_features/log/run-draft';
import { SettingsFields } from '@/app/_features/log/settings-fields';
import { SiteGroup } from '@/app/_features/log/site-group';
import { focusOn, useFocusWish } from '@/app/_features/log/use-focus-wish';
import { useHotkeys } from '@/app/_features/log/use-hotkeys';
import { useRunForm } from '@/app/_features/log/use-run-form';
import { Button } from '@/app/_ui/button';
import { Field } from '@/app/_ui/field';
import { joinClasses } from '@/app/_ui/join-classes';

/** The next run, by keyboard: site, readings, Enter. Nothing is logged twice, nothing unread is blank. */
export function RunForm({ areKeysOn }: { readonly areKeysOn: boolean }) {
  const { state, openDialog } = useLogCase();
  const frame = useRef<HTMLFormElement>(null);
  const focusedChannel = useRef<string | null>(null);
  const wishFocus = useFocusWish(frame);
  const form = useRunForm(wishFocus);
  const { draft, channels, sentences } = form;

  const noResponse = () => {
    const isHere = frame.current?.contains(document.activeElement) === true;
    const focused = isHere ? channels.find((channel) => channel.id === focusedChannel.current) : undefined;
    const channel = focused ?? channels.find((candidate) => !isTouched(draft.channels[candidate.id]));
    if (channel === undefined) return;
    if (isTouched(draft.channels[channel.id])) {
      form.setHint(`${channel.name} has values: clear them before no response is marked`);
      return;
    }
    wishFocus({ field: `${channel.id}.highest` });
    form.typeChannel(channel.id, { kind: 'absent', highest: draft.settings.intensity });
  };
  useHotkeys(
    {
      n: noResponse,
      r: form.sameSettings,
      s: () => focusOn(frame.current, 'site'),
      u: () => {
        const last = state.runs.at(-1);
        if (last !== undefined) openDialog({ kind: 'correct', runSeq: last.seq });
      },
    },
    areKeysOn && form.question === null,
    (key) => form.setHint(`Key ${key.toUpperCase()} not taken: a number is half typed. Leave its field first, with Tab`),
  );
  const handleKey = (event: KeyboardEvent) => {
    if (event.key !== 'Enter') return;
    const target = event.target as HTMLElement;
    if (!(target instanceof HTMLInputElement) && target.getAttribute('role') !== 'radio') return;
    event.preventDefault();
    if (!event.repeat) form.log(false);
  };
  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    form.log(false);
  };
  return (
    <form ref={frame} method="post" noValidate aria-label="Next run" onKeyDown={handleKey} onSubmit={handleSubmit} className="flex flex-col gap-2.5 border-y border-rule bg-raised px-5 py-2.5">
      <SiteGroup nerves={state.plan.nerves} siteId={draft.settings.siteId} onChoose={(siteId, isByKey) => form.chooseSite(siteId, isByKey ? 'reading' : 'site')} />
      <SettingsFields plan={state.plan} draft={draft} sentences={sentences} onDraft={form.change} />
      <div className="overflow-x-auto">
        <div className={joinClasses(readingColumns, 'pb-1 text-sm text-second')} aria-hidden="true">
          <span />
          <span>Onset, ms</span>
          <span>{`Amplitude, ${channels.every((channel) => channel.kind === 'nerve') ? 'µV' : 'mV'}`}</span>
          <span>Neg. peak, ms</span>
          <span>Trace</span>
          <span>Against baseline</span>
        </div>
        {channels.map((channel) => {
          const path = form.judged?.paths.find((judged) => judged.pathId === `${draft.settings.siteId}/${channel.id}`);
          const segments = form.judged?.segments.filter((segment) => segment.channelId === channel.id) ?? [];
          const segment = segments.find((candidate) => candidate.proximalSiteId === draft.settings.siteId) ?? segments[0] ?? null;
          return (
            <ReadingRow
              key={channel.id}
              channel={channel}
              typed={draft.channels[channel.id] ?? notReadDraft}
              intensity={draft.settings.intensity}
              sentences={sentences}
              preview={path === undefined ? null : { path, segment }}
              onType={(typed) => form.typeChannel(channel.id, typed)}
              onFocus={() => {
                focusedChannel.current = channel.id;
              }}
            />
          );
        })}
        {channels.length === 0 ? <p className="text-second">No channel records from this site</p> : null}
      </div>
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" variant="primary" hotkey="Enter">Log run</Button>
        <Button hotkey="N" onClick={noResponse}>No response</Button>
        <Button hotkey="R" onClick={form.sameSettings}>Same settings</Button>
        <Button hotkey="U" onClick={() => openDialog({ kind: 'correct', runSeq: state.runs.at(-1)?.seq ?? 0 })} disabled={state.runs.length === 0}>Correct last run</Button>
        <Field label="Note" isLabelHidden placeholder="Note" value={draft.note} maxLength={300} autoComplete="off" className="min-w-40 flex-1" onChange={(event) => form.change({ ...draft, note: event.currentTarget.value })} />
        {form.hint === null ? null : <p role="status" className="border-l-4 border-ink pl-3 font-semibold">{form.hint}</p>}
      </div>
      {form.question === null ? null : (
        <QuestionStrip
          question={form.question}
          onCorrect={() => {
            form.setQuestion(null);
            wishFocus('reading');
          }}
          onConfirm={() => form.log(true)}
        />
      )}
    </form>
  );
}
