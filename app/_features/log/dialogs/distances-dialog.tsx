'use client';

import { useState } from 'react';

import { CommandDialog } from '@/app/_features/log/command-dialog';
import { useLogCase } from '@/app/_features/log/log-context';
import { NumericInput } from '@/app/_features/log/numeric-input';
import { readNumber } from '@/app/_features/log/read-number';
import { Field } from '@/app/_ui/field';
import { SelectField } from '@/app/_ui/select-field';
import { actionNames } from '@/lib/text/action-names';
import { clockTime } from '@/lib/text/format';

/** Distances measured again, all sites of one nerve at once. Void ones start empty: an old number is no measurement. */
export function DistancesDialog({ firstNerveId, onClose }: { readonly firstNerveId: string; readonly onClose: () => void }) {
  const { state, timeZone } = useLogCase();
  const voidNerveId = Object.keys(state.distancesVoidSince)[0];
  const [nerveId, setNerveId] = useState(voidNerveId ?? firstNerveId);
  const [typed, setTyped] = useState<Readonly<Record<string, string>>>({});
  const [reason, setReason] = useState('');
  const nerve = state.plan.nerves.find((candidate) => candidate.id === nerveId);
  const voidSince = state.distancesVoidSince[nerveId];
  const sites = nerve?.sites ?? [];
  const valueOf = (siteId: string, positionMm: number) => typed[siteId] ?? (voidSince === undefined ? String(positionMm) : '');
  const read = sites.map((site) => ({ site, number: readNumber(valueOf(site.id, site.positionMm), 'positionMm') }));
  const command = () => {
    const positions: { siteId: string; positionMm: number }[] = [];
    for (const { site, number } of read) {
      if (number.kind === 'empty') return `${site.name} is empty: each site of the nerve needs its position in mm`;
      if (number.kind === 'wrong') return number.sentence;
      positions.push({ siteId: site.id, positionMm: number.value });
    }
    return { name: 'measure-distances', nerveId, positions, reason: reason.trim() === '' ? null : reason } as const;
  };
  return (
    <CommandDialog
      title={actionNames.distances}
      description={voidSince === undefined ? 'In mm along the nerve from its most proximal site.' : `Void since ${clockTime(voidSince, timeZone)}. In mm along the nerve from its most proximal site.`}
      action="Log distances"
      command={command}
      onClose={onClose}
    >
      <SelectField label="Nerve" value={nerveId} onChange={(event) => { setNerveId(event.currentTarget.value); setTyped({}); }} options={state.plan.nerves.map((candidate) => ({ value: candidate.id, label: candidate.name }))} />
      <div className="grid grid-cols-2 gap-3">
        {read.map(({ site, number }) => (
          <NumericInput
            key={site.id}
            label={site.name}
            isLabelShown
            name={`position.${site.id}`}
            unit="mm"
            value={valueOf(site.id, site.positionMm)}
            placeholder={voidSince === undefined ? '' : 'measure'}
            error={number.kind === 'wrong' ? number.sentence : undefined}
            onType={(position) => setTyped({ ...typed, [site.id]: position })}
          />
        ))}
      </div>
      <Field label="Note" hint="May stay empty" value={reason} maxLength={200} autoComplete="off" onChange={(event) => setReason(event.currentTarget.value)} />
    </CommandDialog>
  );
}
