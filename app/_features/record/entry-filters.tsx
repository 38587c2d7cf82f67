import { Field } from '@/app/_ui/field';
import { SelectField } from '@/app/_ui/select-field';
import type { EntryGroup } from '@/app/_features/record/record-rows';

/** Which entries are shown. */
export interface Filters {
  readonly group: EntryGroup | 'all';
  readonly words: string;
}

const groups: readonly { readonly value: Filters['group']; readonly label: string }[] = [
  { value: 'all', label: 'All kinds' },
  { value: 'runs', label: 'Runs' },
  { value: 'baselines', label: 'Baselines' },
  { value: 'alerts', label: 'Notices and alerts' },
  { value: 'steps', label: 'Steps and distances' },
  { value: 'conditions', label: 'Conditions' },
  { value: 'corrections', label: 'Corrections' },
  { value: 'messages', label: 'Messages' },
  { value: 'case', label: 'Plan, phases, closing' },
];

/** By kind and by words. Nothing is removed from the record; the count says how much is shown. */
export function EntryFilters({ filters, onFilters }: { readonly filters: Filters; readonly onFilters: (filters: Filters) => void }) {
  return (
    <div className="flex flex-wrap items-end gap-4">
      <SelectField label="Kind" className="w-56" value={filters.group} options={groups} onChange={(event) => onFilters({ ...filters, group: event.currentTarget.value as Filters['group'] })} />
      <Field label="Words" type="search" autoComplete="off" className="w-64" value={filters.words} onChange={(event) => onFilters({ ...filters, words: event.currentTarget.value })} />
    </div>
  );
}
