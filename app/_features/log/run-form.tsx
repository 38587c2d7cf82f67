'use client';

import { useRef, type FormEvent, type KeyboardEvent } from 'react';

import { useLogCase } from '@/app/_features/log/log-context';
import { QuestionStrip } from '@/app/_features/log/question-strip';
import { ReadingRows } from '@/app/_features/log/reading-rows';
import { RunActions } from '@/app/_features/log/run-actions';
import { isTouched } from '@/app/_features/log/run-draft';
import { SettingsFields } from '@/app/_features/log/settings-fields';
import { SiteGroup } from '@/app/_features/log/site-group';
import { focusOn, useFocusWish } from '@/app/_features/log/use-focus-wish';
import { useHotkeys } from '@/app/_features/log/use-hotkeys';
import { useRunForm } from '@/app/_features/log/use-run-form';

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
  const correctLast = () => {
    const last = state.runs.at(-1);
    if (last !== undefined) openDialog({ kind: 'correct', runSeq: last.seq });
  };
  useHotkeys(
    {
      n: noResponse,
      r: form.sameSettings,
      s: () => focusOn(frame.current, 'site'),
      u: correctLast,
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
      <ReadingRows form={form} onFocusChannel={(channelId) => { focusedChannel.current = channelId; }} />
      <RunActions form={form} onNoResponse={noResponse} onCorrect={correctLast} />
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
