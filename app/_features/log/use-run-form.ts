'use client';

import { useEffect, useMemo, useRef, useState } from 'react';

import { askBack } from '@/app/_features/log/ask-back';
import type { FocusWish } from '@/app/_features/log/use-focus-wish';
import { useLogCase } from '@/app/_features/log/log-context';
import { channelsOf, draftFor, isTouched, purposeFor, settingsFor, sitesOf, type ChannelDraft, type RunDraft } from '@/app/_features/log/run-draft';
import { runFromDraft, type FieldSentences } from '@/app/_features/log/run-from-draft';
import { serverNowMs } from '@/app/_live/use-now';
import type { CaseState } from '@/lib/case/case-state';
import { judgeInCase } from '@/lib/case/judge-in-case';
import { momentOfMs } from '@/lib/units/moment-of-ms';

/** A second Enter so soon after a run is the same hand, not a second run. */
const sameHandMs = 800;

/** The form of the next run as its parts see it. */
export type RunFormParts = ReturnType<typeof useRunForm>;

/** The next run: what is typed, what it would mean, and logging it exactly once. */
export function useRunForm(wishFocus: (wish: FocusWish) => void) {
  const { state, give } = useLogCase();
  const [draft, setDraft] = useRunDraft(state);
  const [sentences, setSentences] = useState<FieldSentences>({});
  const [question, setQuestion] = useState<string | null>(null);
  const [hint, setHint] = useState<string | null>(null);
  const isLocked = useRef(false);
  const loggedAtMs = useRef(-Infinity);
  const channels = useMemo(() => channelsOf(state, draft.settings.siteId), [state, draft.settings.siteId]);
  const read = useMemo(() => runFromDraft(draft, channels), [draft, channels]);
  const judged = useMemo(() => (read.kind === 'run' ? judgeInCase(state, { at: momentOfMs(serverNowMs()), run: read.run }) : null), [read, state]);

  useEffect(() => {
    isLocked.current = false;
  }, [draft]);

  const change = (next: RunDraft) => {
    setDraft(next);
    setSentences({});
    setQuestion(null);
    setHint(null);
  };

  const chooseSite = (siteId: string, wish: FocusWish) => {
    const kept = channelsOf(state, siteId).map((channel) => channel.id);
    const left = channels.find((channel) => isTouched(draft.channels[channel.id]) && !kept.includes(channel.id));
    if (left !== undefined) {
      setHint(`${left.name} has values and is not recorded from that site: log or clear them first`);
      return;
    }
    wishFocus(wish);
    change({ ...draft, settings: settingsFor(state, siteId) });
  };
  const typeChannel = (channelId: string, typed: ChannelDraft) => change({ ...draft, channels: { ...draft.channels, [channelId]: typed } });
  const sameSettings = () => {
    const last = state.runs.at(-1);
    if (last === undefined) setHint('No run yet to take the settings from');
    else if (channels.some((channel) => isTouched(draft.channels[channel.id]))) setHint('Readings are typed already: log or clear them before the settings change');
    else chooseSite(last.run.siteId, 'reading');
  };
  const log = (isConfirmed: boolean) => {
    if (isLocked.current) return;
    if (read.kind === 'wrong') {
      setSentences(read.sentences);
      wishFocus('error');
      return;
    }
    if (read.kind === 'nothing-read') {
      if (performance.now() - loggedAtMs.current > sameHandMs) setHint('Nothing read yet: type onset or amplitude, or mark no response');
      return;
    }
    const odd = isConfirmed || judged === null ? null : askBack(judged.segments, state.plan);
    if (odd !== null) {
      setQuestion(odd);
      return;
    }
    isLocked.current = true;
    loggedAtMs.current = performance.now();
    const sent = draft;
    wishFocus('site');
    change({ ...draft, channels: {}, note: '' });
    void give({ name: 'log-run', run: { ...read.run, readings: [...read.run.readings] } }).then((outcome) => {
      if (outcome.kind !== 'refused') return;
      setDraft(sent);
      setHint(outcome.message);
    });
  };
  return { draft, channels, sentences, question, hint, judged, change, chooseSite, typeChannel, sameSettings, log, setQuestion, setHint };
}

/** What is typed of the next run. A new phase brings its own purpose; until then the person's choice stands. */
function useRunDraft(state: CaseState): [RunDraft, (next: RunDraft) => void] {
  const [draft, setDraft] = useState<RunDraft>(() => draftFor(state, sitesOf(state)[0]?.id ?? '', purposeFor(state)));
  const [phaseSeen, setPhaseSeen] = useState(state.phase);
  if (phaseSeen !== state.phase) {
    setPhaseSeen(state.phase);
    setDraft({ ...draft, purpose: purposeFor(state) });
  }
  return [draft, setDraft];
}
