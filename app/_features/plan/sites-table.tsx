'use client';

import { useFieldArray, useFormContext } from 'react-hook-form';

import { freeKey } from '@/app/_features/plan/free-key';
import { PlanField } from '@/app/_features/plan/plan-field';
import type { PlanForm } from '@/app/_features/plan/plan-form';
import { Button } from '@/app/_ui/button';
import { Cell, HeadCell, Table } from '@/app/_ui/table';

const mostSites = 12;
const nextSiteMm = 100;

/** The sites of one nerve: name, place, key and first current; one of the case is the closing site. */
export function SitesTable({ nerveIndex }: { readonly nerveIndex: number }) {
  const { control, register, getValues } = useFormContext<PlanForm>();
  const { fields, append, remove } = useFieldArray({ control, name: `plan.nerves.${nerveIndex}.sites`, keyName: 'rowKey' });
  const add = () => {
    const { nerves } = getValues('plan');
    const sites = nerves[nerveIndex]?.sites ?? [];
    const used = nerves.flatMap((nerve) => nerve.sites.map((site) => site.hotkey));
    const last = sites.at(-1);
    append({
      id: freeKey('site', nerves.flatMap((nerve) => nerve.sites.map((site) => site.id))),
      name: '',
      positionMm: last === undefined ? 0 : last.positionMm + nextSiteMm,
      hotkey: ['1', '2', '3', '4', '5', '6', '7', '8', '9', '0'].find((key) => !used.includes(key)) ?? null,
      defaultIntensityMa: last?.defaultIntensityMa ?? 15,
    });
  };
  return (
    <>
      <Table caption={`Sites of nerve ${nerveIndex + 1} from proximal to distal`} className="max-w-4xl">
        <thead>
          <tr>
            <HeadCell>Site</HeadCell>
            <HeadCell>Position</HeadCell>
            <HeadCell>Key, a digit</HeadCell>
            <HeadCell>First current</HeadCell>
            <HeadCell>Closing site</HeadCell>
            <HeadCell><span className="sr-only">Remove</span></HeadCell>
          </tr>
        </thead>
        <tbody>
          {fields.map((site, index) => {
            const row = `plan.nerves.${nerveIndex}.sites.${index}` as const;
            const said = site.name === '' ? `site ${index + 1}` : site.name;
            return (
              <tr key={site.rowKey}>
                <Cell className="min-w-44"><PlanField name={`${row}.name`} label={`Name of ${said}`} isLabelHidden /></Cell>
                <Cell className="min-w-32"><PlanField name={`${row}.positionMm`} label={`Position of ${said}`} isLabelHidden isNumeric unit="mm" /></Cell>
                <Cell className="w-24"><PlanField name={`${row}.hotkey`} label={`Key of ${said}`} isLabelHidden isKey /></Cell>
                <Cell className="min-w-32"><PlanField name={`${row}.defaultIntensityMa`} label={`First current at ${said}`} isLabelHidden isNumeric unit="mA" /></Cell>
                <Cell>
                  <label className="inline-flex min-h-9 min-w-9 items-center align-middle">
                    <input type="radio" value={site.id} {...register('plan.closingSiteId')} className="size-4 accent-stain" />
                    <span className="sr-only">{`Closing site: ${said}`}</span>
                  </label>
                </Cell>
                <Cell className="text-right">
                  {fields.length > 1 ? <Button onClick={() => remove(index)} aria-label={`Remove site ${said}`}>Remove</Button> : null}
                </Cell>
              </tr>
            );
          })}
        </tbody>
      </Table>
      <Button onClick={add} disabled={fields.length >= mostSites} className="mt-2">Add a site</Button>
    </>
  );
}
