'use client';

import { useFormContext, useWatch } from 'react-hook-form';

import { PlanField } from '@/app/_features/plan/plan-field';
import { titleForSide, type PlanForm } from '@/app/_features/plan/plan-form';
import type { PlanPlace } from '@/app/_features/plan/plan-places';
import { Section } from '@/app/_features/plan/section';
import { Choice } from '@/app/_ui/choice';
import { SelectField } from '@/app/_ui/select-field';
import { templates } from '@/lib/reference/templates/templates';

interface CaseFieldsProps {
  readonly places: readonly PlanPlace[];
  readonly onTemplate: (templateId: string) => void;
}

const sides = [
  { value: 'left', label: 'Left' },
  { value: 'right', label: 'Right' },
] as const;

/** Which operation, on which side, where; and who, which stays out of the log. */
export function CaseFields({ places, onTemplate }: CaseFieldsProps) {
  const { register, setValue, getValues } = useFormContext<PlanForm>();
  const templateId = useWatch<PlanForm, 'plan.templateId'>({ name: 'plan.templateId' });
  const side = useWatch<PlanForm, 'plan.side'>({ name: 'plan.side' });
  const hospitalId = useWatch<PlanForm, 'hospitalId'>({ name: 'hospitalId' });
  const theatreNames = (places.find((place) => place.hospitalId === hospitalId) ?? places[0])?.theatreNames ?? [];
  const chooseHospital = (chosen: string) => {
    const there = places.find((place) => place.hospitalId === chosen)?.theatreNames ?? [];
    setValue('hospitalId', chosen, { shouldDirty: true });
    if (!there.includes(getValues('plan.theatre'))) setValue('plan.theatre', there[0] ?? '');
  };
  const chooseSide = (chosen: 'left' | 'right') => {
    setValue('plan.side', chosen, { shouldDirty: true });
    setValue('plan.title', titleForSide(getValues('plan.title'), chosen));
  };
  return (
    <>
      <Section title="Operation">
        <div className="grid gap-x-6 gap-y-4 md:grid-cols-2 lg:grid-cols-[2fr_1fr_1fr]">
          {places.length > 1 ? (
            <SelectField
              label="Hospital"
              className="md:col-span-2 lg:col-span-3 lg:max-w-md"
              value={hospitalId}
              onChange={(event) => chooseHospital(event.currentTarget.value)}
              options={places.map((place) => ({ value: place.hospitalId, label: place.hospitalName }))}
            />
          ) : null}
          <SelectField
            label="Template"
            value={templateId}
            onChange={(event) => onTemplate(event.currentTarget.value)}
            options={templates.map((template) => ({ value: template.templateId, label: template.procedure }))}
          />
          <Choice legend="Side" options={sides} value={side} onChoose={chooseSide} />
          <SelectField label="Theatre" {...register('plan.theatre')} options={theatreNames.map((name) => ({ value: name, label: name }))} />
          <PlanField name="plan.procedure" label="Procedure" />
          <PlanField name="plan.title" label="Title of the case" className="lg:col-span-2" />
        </div>
      </Section>
      <Section title="Patient" text="Stays out of the log: it holds a sealed fingerprint only. The wall never shows it.">
        <div className="grid max-w-3xl gap-x-6 gap-y-4 md:grid-cols-2">
          <PlanField name="identity.patientLabel" label="Patient label" />
          <PlanField name="identity.recordNumber" label="Record number" />
        </div>
      </Section>
    </>
  );
}
