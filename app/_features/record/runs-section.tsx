'use client';

import { useMemo, useState } from 'react';

import { PagedRows } from '@/app/_features/record/paged-rows';
import { RecordSection } from '@/app/_features/record/record-section';
import { runLines, type RunLine } from '@/app/_features/record/run-lines';
import { RunsTable } from '@/app/_features/record/runs-table';
import { SelectField } from '@/app/_ui/select-field';
import type { CaseCourse } from '@/lib/case/course/case-course';

type Finding = 'all' | 'past-limit' | 'not-compared' | 'corrected' | 'late' | 'baseline';

const findings: readonly { readonly value: Finding; readonly label: string }[] = [
  { value: 'all', label: 'All runs' },
  { value: 'past-limit', label: 'Past a limit' },
  { value: 'not-compared', label: 'Not compared' },
  { value: 'baseline', label: 'Baseline runs' },
  { value: 'corrected', label: 'Corrected' },
  { value: 'late', label: 'Received late' },
];

/** Every run with its reading and % of baseline, by site and by what was found. */
export function RunsSection({ course, timeZone }: { readonly course: CaseCourse; readonly timeZone: string }) {
  const [site, setSite] = useState('all');
  const [finding, setFinding] = useState<Finding>('all');
  const { plan } = course.final;
  const lines = useMemo(() => runLines(course.runs, plan), [course.runs, plan]);
  const wanted = useMemo(() => new Set(lines.filter((line) => isWanted(line, site, finding)).map((line) => line.run.seq)), [lines, site, finding]);
  const shown = lines.filter((line) => wanted.has(line.run.seq));
  const sites = plan.nerves.flatMap((nerve) => nerve.sites).map(({ id, name }) => ({ value: id, label: name }));
  return (
    <RecordSection
      id="runs"
      heading={`All runs (${course.runs.length})`}
      aside={
        <div className="flex flex-wrap items-end gap-4 print:hidden">
          <SelectField label="Site" className="w-48" value={site} options={[{ value: 'all', label: 'All sites' }, ...sites]} onChange={(event) => setSite(event.currentTarget.value)} />
          <SelectField label="Found" className="w-48" value={finding} options={findings} onChange={(event) => setFinding(event.currentTarget.value as Finding)} />
        </div>
      }
    >
      <p role="status" className="mb-2 text-sm text-second">{wanted.size === course.runs.length ? `All ${wanted.size} runs` : `${wanted.size} of ${course.runs.length} runs`}</p>
      <PagedRows rows={shown} noun="lines" filterKey={`${site}-${finding}`}>
        {(page) => <RunsTable lines={page} timeZone={timeZone} />}
      </PagedRows>
    </RecordSection>
  );
}

function isWanted(line: RunLine, site: string, finding: Finding): boolean {
  if (site !== 'all' && line.run.siteId !== site) return false;
  switch (finding) {
    case 'all':
      return true;
    case 'past-limit':
      return line.isPastLimit;
    case 'not-compared':
      return line.isNotCompared;
    case 'baseline':
      return line.version.run?.purpose === 'baseline';
    case 'corrected':
      return line.run.corrections.length > 0;
    case 'late':
      return line.run.lateMs !== null;
  }
}
