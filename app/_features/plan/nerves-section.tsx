'use client';

import { useFieldArray, useFormContext } from 'react-hook-form';

import { PlanField } from '@/app/_features/plan/plan-field';
import type { PlanForm } from '@/app/_features/plan/plan-form';
import { PlanLine } from '@/app/_features/plan/plan-line';
import { Section } from '@/app/_features/plan/section';
import { SitesTable } from '@/app/_features/plan/sites-table';
import { freeKey } from '@/app/_features/plan/free-key';
import { Button } from '@/app/_ui/button';
import { SelectField } from '@/app/_ui/select-field';

const mostNerves = 8;
const roles = [
  { value: 'at-risk', label: 'At risk' },
  { value: 'control', label: 'Control, outside the operation' },
];

/** The nerves with their sites. A control outside the operation tells a fault of the test from a fault of the nerve. */
export function NervesSection() {
  const { control, register, watch } = useFormContext<PlanForm>();
  const { fields, append, remove } = useFieldArray({ control, name: 'plan.nerves', keyName: 'rowKey' });
  const hasControl = watch('plan.nerves').some((nerve) => nerve.role === 'control');
  const add = () => {
    const id = freeKey('nerve', fields.map((nerve) => nerve.id));
    append({ id, name: '', role: 'at-risk', sites: [{ id: `${id}-site`, name: '', positionMm: 0, hotkey: null, defaultIntensityMa: 15 }] });
  };
  return (
    <Section
      title="Nerves and sites"
      text="From proximal to distal, in mm along the nerve from its most proximal site. Measure on the patient: a template’s distances belong to nobody."
      action={<Button onClick={add} disabled={fields.length >= mostNerves}>Add a nerve</Button>}
    >
      {hasControl ? null : <p role="status" className="mb-4 border-l-4 border-ink pl-3 font-semibold">No control path: a loss cannot be told from a fault of relaxant, electrode or stimulator</p>}
      <div className="flex flex-col gap-8">
        {fields.map((nerve, index) => (
          <fieldset key={nerve.rowKey} className="min-w-0">
            <legend className="sr-only">{`Nerve ${index + 1}`}</legend>
            <PlanLine nerveIndex={index} />
            <div className="mb-3 flex flex-wrap items-end gap-x-6 gap-y-3">
              <PlanField name={`plan.nerves.${index}.name`} label="Nerve" className="w-64" />
              <SelectField label="Role" className="w-64" {...register(`plan.nerves.${index}.role`)} options={roles} />
              {fields.length > 1 ? <Button onClick={() => remove(index)} aria-label={`Remove nerve ${nerve.name}`}>Remove nerve</Button> : null}
            </div>
            <SitesTable nerveIndex={index} />
          </fieldset>
        ))}
      </div>
    </Section>
  );
}
