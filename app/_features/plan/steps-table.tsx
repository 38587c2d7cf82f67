'use client';

import { useFieldArray, useFormContext } from 'react-hook-form';

import { freeKey } from '@/app/_features/plan/free-key';
import { PlanField } from '@/app/_features/plan/plan-field';
import type { PlanForm } from '@/app/_features/plan/plan-form';
import { Section } from '@/app/_features/plan/section';
import { Button } from '@/app/_ui/button';
import { Cell, HeadCell, Table } from '@/app/_ui/table';
import { consoleKeys, isConsoleKey } from '@/lib/case/console-keys';

const mostSteps = 20;

/** Surgical steps with their keys. After a risk step every required path is to be tested again. */
export function StepsTable() {
  const { control, register, getValues } = useFormContext<PlanForm>();
  const { fields, append, remove } = useFieldArray({ control, name: 'plan.steps', keyName: 'rowKey' });
  const add = () => {
    const used = getValues('plan.steps').map((step) => step.hotkey);
    const hotkey = [...'abcdefghijklmnopqrstuvwxyz'].find((key) => !isConsoleKey(key) && !used.includes(key)) ?? null;
    append({ id: freeKey('step', fields.map((step) => step.id)), label: '', since: '', isRisk: true, voidsDistances: false, hotkey });
  };
  return (
    <Section
      title="Steps"
      text={`A risk step makes every test before it old. The console itself takes ${Object.keys(consoleKeys).join(', ')} and the digits.`}
      action={<Button onClick={add} disabled={fields.length >= mostSteps}>Add a step</Button>}
    >
      <Table caption="Steps, one on each line" className="max-w-4xl">
        <thead>
          <tr>
            <HeadCell>Step</HeadCell>
            <HeadCell>After “since”</HeadCell>
            <HeadCell>Key, a letter</HeadCell>
            <HeadCell>Risk step</HeadCell>
            <HeadCell>Voids distances</HeadCell>
            <HeadCell><span className="sr-only">Remove</span></HeadCell>
          </tr>
        </thead>
        <tbody>
          {fields.map((step, index) => {
            const row = `plan.steps.${index}` as const;
            const said = step.label === '' ? `step ${index + 1}` : step.label;
            return (
              <tr key={step.rowKey}>
                <Cell className="min-w-48"><PlanField name={`${row}.label`} label={`Name of ${said}`} isLabelHidden /></Cell>
                <Cell className="min-w-48"><PlanField name={`${row}.since`} label={`${said} after the word since`} isLabelHidden /></Cell>
                <Cell className="w-24"><PlanField name={`${row}.hotkey`} label={`Key of ${said}`} isLabelHidden isKey /></Cell>
                <Cell><Tick label={`${said} is a risk step`} {...register(`${row}.isRisk`)} /></Cell>
                <Cell><Tick label={`${said} voids distances`} {...register(`${row}.voidsDistances`)} /></Cell>
                <Cell className="text-right"><Button onClick={() => remove(index)} aria-label={`Remove step ${said}`}>Remove</Button></Cell>
              </tr>
            );
          })}
        </tbody>
      </Table>
    </Section>
  );
}

function Tick({ label, ...input }: { readonly label: string } & React.ComponentProps<'input'>) {
  return (
    <label className="inline-flex min-h-9 min-w-9 items-center align-middle">
      <input type="checkbox" {...input} className="size-4 accent-stain" />
      <span className="sr-only">{label}</span>
    </label>
  );
}
