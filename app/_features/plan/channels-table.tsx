'use client';

import { useFieldArray, useFormContext } from 'react-hook-form';

import { freeKey } from '@/app/_features/plan/free-key';
import { PlanField } from '@/app/_features/plan/plan-field';
import type { PlanForm } from '@/app/_features/plan/plan-form';
import { Section } from '@/app/_features/plan/section';
import { Button } from '@/app/_ui/button';
import { SelectField } from '@/app/_ui/select-field';
import { Cell, HeadCell, Table } from '@/app/_ui/table';

const mostChannels = 16;
const kinds = [{ value: 'muscle', label: 'Muscle' }, { value: 'nerve', label: 'Nerve' }];
const conventions = [{ value: 'baseline-to-peak', label: 'Baseline to peak' }, { value: 'peak-to-peak', label: 'Peak to peak' }];

/** Where responses are recorded. Calm rests on the required ones: each needs a fresh run from every site. */
export function ChannelsTable() {
  const { control, register, watch, getValues } = useFormContext<PlanForm>();
  const { fields, append, remove } = useFieldArray({ control, name: 'plan.channels', keyName: 'rowKey' });
  const nerves = watch('plan.nerves');
  const add = () => {
    const nerve = getValues('plan.nerves')[0];
    append({
      id: freeKey('channel', fields.map((channel) => channel.id)),
      name: '',
      longName: '',
      kind: 'muscle',
      convention: 'baseline-to-peak',
      nerveId: nerve?.id ?? '',
      positionMm: (nerve?.sites.at(-1)?.positionMm ?? 0) + 70,
    });
  };
  return (
    <Section
      title="Channels"
      text="Muscles and nerves that are recorded. Stable is said only while every required channel has a fresh run from every site of its nerve."
      action={<Button onClick={add} disabled={fields.length >= mostChannels}>Add a channel</Button>}
    >
      <Table caption="Channels, one on each line">
        <thead>
          <tr>
            <HeadCell>Short name</HeadCell>
            <HeadCell>Full name</HeadCell>
            <HeadCell>Nerve</HeadCell>
            <HeadCell>Position</HeadCell>
            <HeadCell>Kind</HeadCell>
            <HeadCell>Amplitude read</HeadCell>
            <HeadCell>Required</HeadCell>
            <HeadCell><span className="sr-only">Remove</span></HeadCell>
          </tr>
        </thead>
        <tbody>
          {fields.map((channel, index) => {
            const row = `plan.channels.${index}` as const;
            const said = channel.name === '' ? `channel ${index + 1}` : channel.name;
            return (
              <tr key={channel.rowKey}>
                <Cell className="min-w-24"><PlanField name={`${row}.name`} label={`Short name of ${said}`} isLabelHidden /></Cell>
                <Cell className="min-w-60"><PlanField name={`${row}.longName`} label={`Full name of ${said}`} isLabelHidden /></Cell>
                <Cell className="min-w-40"><SelectField label={`Nerve of ${said}`} isLabelHidden {...register(`${row}.nerveId`)} options={nerves.map((nerve) => ({ value: nerve.id, label: nerve.name === '' ? 'Unnamed nerve' : nerve.name }))} /></Cell>
                <Cell className="min-w-28"><PlanField name={`${row}.positionMm`} label={`Position of ${said}`} isLabelHidden isNumeric unit="mm" /></Cell>
                <Cell className="min-w-28"><SelectField label={`Kind of ${said}`} isLabelHidden {...register(`${row}.kind`)} options={kinds} /></Cell>
                <Cell className="min-w-44"><SelectField label={`How the amplitude of ${said} is read`} isLabelHidden {...register(`${row}.convention`)} options={conventions} /></Cell>
                <Cell>
                  <label className="inline-flex min-h-9 min-w-9 items-center align-middle">
                    <input type="checkbox" value={channel.id} {...register('requiredChannelIds')} className="size-4 accent-stain" />
                    <span className="sr-only">{`${said} is required`}</span>
                  </label>
                </Cell>
                <Cell className="text-right">
                  {fields.length > 1 ? <Button onClick={() => remove(index)} aria-label={`Remove channel ${said}`}>Remove</Button> : null}
                </Cell>
              </tr>
            );
          })}
        </tbody>
      </Table>
    </Section>
  );
}
