'use client';

import { useMemo } from 'react';

import '@/app/_features/record/record.css';
import { AlertsSection } from '@/app/_features/record/alerts-section';
import { BaselinesSection } from '@/app/_features/record/baselines-section';
import { BlindSection } from '@/app/_features/record/blind-section';
import { ConditionsSection } from '@/app/_features/record/conditions-section';
import { CorrectionsSection } from '@/app/_features/record/corrections-section';
import { EntriesSection } from '@/app/_features/record/entries-section';
import { ExaminationSection } from '@/app/_features/record/examination-section';
import { NerveSection } from '@/app/_features/record/nerve-section';
import { RecordContents } from '@/app/_features/record/record-contents';
import { RecordHead } from '@/app/_features/record/record-head';
import { RunsSection } from '@/app/_features/record/runs-section';
import { SummarySection } from '@/app/_features/record/summary-section';
import { TalkSection } from '@/app/_features/record/talk-section';
import type { CaseCourse } from '@/lib/case/course/case-course';
import type { CaseHeadReply, WireEntry } from '@/lib/contracts/http/replies';

interface CaseRecordProps {
  readonly head: CaseHeadReply;
  readonly entries: readonly WireEntry[];
  readonly course: CaseCourse;
}

/** The whole record, section by section, with its contents list. */
export function CaseRecord({ head, entries, course }: CaseRecordProps) {
  const { timeZone } = head;
  const part = { course, timeZone };
  const contents = useMemo(() => contentsOf(course), [course]);
  return (
    <div className="record mx-auto flex w-full max-w-400 flex-col px-6 lg:flex-row lg:gap-10">
      <RecordContents lines={contents} />
      <div className="min-w-0 flex-1 py-8">
        <RecordHead head={head} entries={entries} course={course} />
        <SummarySection course={course} entries={entries} timeZone={timeZone} />
        <AlertsSection {...part} />
        <BlindSection {...part} />
        <NerveSection {...part} />
        <RunsSection {...part} />
        <ConditionsSection {...part} />
        <TalkSection {...part} />
        <ExaminationSection {...part} />
        <BaselinesSection {...part} />
        <CorrectionsSection {...part} />
        <EntriesSection entries={entries} plan={course.final.plan} timeZone={timeZone} />
      </div>
    </div>
  );
}

function contentsOf(course: CaseCourse) {
  const corrections = course.runs.reduce((count, run) => count + run.corrections.length, 0);
  return [
    { id: 'summary', label: 'Summary' },
    { id: 'alerts', label: `Alerts (${course.alerts.length})` },
    { id: 'blind-time', label: 'Blind time' },
    { id: 'nerves', label: 'Nerve by nerve' },
    { id: 'runs', label: `All runs (${course.runs.length})` },
    { id: 'conditions', label: 'Conditions and steps' },
    { id: 'messages', label: `Messages (${course.talk.length})` },
    { id: 'examination', label: 'Examination' },
    { id: 'baselines', label: `Baselines (${course.baselines.length})` },
    { id: 'corrections', label: `Corrections (${corrections})` },
    { id: 'entries', label: `Entries (${course.entries.length})` },
  ];
}
