'use client';

import { useFieldArray, useFormContext } from 'react-hook-form';

import { freeKey } from '@/app/_features/plan/free-key';
import { PlanField } from '@/app/_features/plan/plan-field';
import type { PlanForm } from '@/app/_features/plan/plan-form';
import { Section } from '@/app/_features/plan/section';
import { Button } from '@/app/_ui/button';
import { SelectField } from '@/app/_ui/select-field';
import { TextArea } from '@/app/_ui/text-area';

const families = [
  { value: 'pre-position', label: 'Before positioning' },
  { value: 'through-skin', label: 'Through the skin' },
  { value: 'exposed', label: 'Exposed nerve' },
];

/** What stimulates, how long a pulse, which baseline family first, and the trap of this operation. */
export function StimulusFields() {
  const { control, register, formState } = useFormContext<PlanForm>();
  const { fields, append, remove } = useFieldArray({ control, name: 'plan.electrodes', keyName: 'rowKey' });
  return (
    <Section title="Stimulus" text="A run is compared only with a baseline of the same electrode, family and pulse width.">
      <div className="flex flex-wrap items-end gap-x-6 gap-y-4">
        {fields.map((electrode, index) => (
          <div key={electrode.rowKey} className="flex items-end gap-2">
            <PlanField name={`plan.electrodes.${index}.name`} label={`Electrode ${index + 1}`} className="w-56" />
            {fields.length > 1 ? <Button onClick={() => remove(index)} aria-label={`Remove electrode ${electrode.name}`}>Remove</Button> : null}
          </div>
        ))}
        <Button onClick={() => append({ id: freeKey('electrode', fields.map((electrode) => electrode.id)), name: '' })} disabled={fields.length >= 8}>Add an electrode</Button>
      </div>
      <div className="mt-4 grid gap-x-6 gap-y-4 md:grid-cols-[12rem_16rem_1fr]">
        <PlanField name="plan.defaultPulseWidthUs" label="Pulse width" isNumeric unit="µs" />
        <SelectField label="Baseline family" {...register('plan.defaultFamily')} options={families} />
        <TextArea label="Trap to remember" {...register('plan.trap')} error={formState.errors.plan?.trap?.message} />
      </div>
    </Section>
  );
}
