'use client';

import { get, useFormContext, type FieldPath } from 'react-hook-form';

import { Field } from '@/app/_ui/field';
import type { PlanForm } from '@/app/_features/plan/plan-form';
import { mistakeSentence, typedNumber } from '@/app/_features/plan/typed-number';

interface PlanFieldProps {
  readonly name: FieldPath<PlanForm>;
  readonly label: string;
  readonly isLabelHidden?: boolean;
  readonly unit?: string;
  readonly hint?: string;
  readonly isNumeric?: boolean;
  readonly isKey?: boolean;
  readonly className?: string;
}

/** One field of the plan with the sentence of its own mistake. An empty key is no key. */
export function PlanField({ name, isNumeric = false, isKey = false, ...field }: PlanFieldProps) {
  const { register, getValues, formState } = useFormContext<PlanForm>();
  const message = (get(formState.errors, name) as { readonly message?: unknown } | undefined)?.message;
  const bound = isNumeric
    ? register(name, { setValueAs: typedNumber })
    : isKey
      ? register(name, { setValueAs: (typed: string | null) => (typed === null || typed.trim() === '' ? null : typed.trim().toLowerCase()) })
      : register(name);
  const value: unknown = getValues(name);
  return (
    <Field
      {...field}
      {...bound}
      isNumeric={isNumeric}
      autoComplete="off"
      {...(isKey ? { maxLength: 1 } : {})}
      error={typeof message === 'string' ? mistakeSentence(message, value) : null}
    />
  );
}
