'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { Field } from '@/app/_ui/field';
import { SelectField } from '@/app/_ui/select-field';
import { baselineConcerns } from '@/lib/case/baseline-concerns';
import { baselineRuns } from '@/lib/case/baseline-runs';
import type { BaselineFamily } from '@/lib/case/plan';
import { actionNames } from '@/lib/text/action-names';
import { familyNames } from '@/lib/text/run-sentence';
import { siteName } from '@/lib/text/site-name';

const families = Object.entries(familyNames).map(([value, name]) => ({ value, label: name.charAt(0).toUpperCase() + name.slice(1) }));

/** Accepts the newest baseline runs of one electrode and family; what speaks against them needs a written reason. */
export function BaselineDialog({ onClose }: { readonly onClose: () => void }) {
  const { state } = useLogCase();
  const newest = state.runs.findLast((kept) => kept.run.purpose === 'baseline')?.run;
  const [electrodeId, setElectrodeId] = useState(newest?.electrodeId ?? state.plan.electrodes[0]?.id ?? '');
  const [family, setFamily] = useState<BaselineFamily>(newest?.family ?? state.plan.defaultFamily);
  const [reason, setReason] = useState('');
  const runs = baselineRuns(state, electrodeId, family);
  const concerns = runs.length === 0 ? [] : baselineConcerns(state, runs);
  const sites = state.plan.nerves
    .flatMap((nerve) => nerve.sites)
    .map((site) => ({ siteId: site.id, count: runs.filter((kept) => kept.run.siteId === site.id).length }))
    .filter((row) => row.count > 0);
  return (
    <CommandDialog
      title={actionNames.baseline}
      description="Accepted provisionally until a physician accepts it."
      action={actionNames.baseline}
      command={() => ({ name: 'accept-baseline', family, electrodeId, reason: reason.trim() === '' ? null : reason })}
      onClose={onClose}
    >
      <div className="grid grid-cols-2 gap-4">
        <SelectField label="Electrode" value={electrodeId} onChange={(event) => setElectrodeId(event.currentTarget.value)} options={state.plan.electrodes.map((electrode) => ({ value: electrode.id, label: electrode.name }))} />
        <SelectField label="Family" value={family} onChange={(event) => setFamily(event.currentTarget.value as BaselineFamily)} options={families} />
      </div>
      {sites.length === 0 ? (
        <p>No baseline run with this electrode and family waits to be accepted. Runs count when their purpose is Baseline and they come after the time-out.</p>
      ) : (
        <ul className="border-t border-rule">
          {sites.map((row) => (
            <li key={row.siteId} className="flex justify-between border-b border-rule py-1">
              <span>{siteName(state.plan, row.siteId).replace(/^./, (letter) => letter.toUpperCase())}</span>
              <span className="text-second">{`${row.count} ${row.count === 1 ? 'run' : 'runs'}${row.count < 3 ? ', scatter assumed' : ''}`}</span>
            </li>
          ))}
        </ul>
      )}
      {concerns.length > 0 ? <p className="border-l-4 border-ink pl-3 font-semibold">{`${concerns.join('. ')}. Say why this baseline is accepted all the same`}</p> : null}
      <Field label="Reason" hint={concerns.length > 0 ? 'Needed' : 'May stay empty'} value={reason} maxLength={200} autoComplete="off" autoFocus onChange={(event) => setReason(event.currentTarget.value)} />
    </CommandDialog>
  );
}
