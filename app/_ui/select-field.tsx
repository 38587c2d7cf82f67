import { useId, type ComponentProps } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';

interface SelectFieldProps extends Omit<ComponentProps<'select'>, 'id'> {
  readonly label: string;
  readonly isLabelHidden?: boolean;
  readonly options: readonly { readonly value: string; readonly label: string }[];
  readonly error?: string | null | undefined;
}

/** One labelled choice out of a list, by the browser's own control: it works by keyboard and by touch. */
export function SelectField({ label, isLabelHidden = false, options, error, className, ...select }: SelectFieldProps) {
  const id = useId();
  return (
    <div className={joinClasses('min-w-0', className)}>
      <label htmlFor={id} className={isLabelHidden ? 'sr-only' : 'mb-1 block text-sm text-second'}>
        {label}
      </label>
      <select
        id={id}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? `${id}-error` : undefined}
        className={joinClasses(
          'min-h-9 w-full min-w-0 rounded border bg-ground px-2 py-1.5 text-ink pointer-coarse:min-h-11',
          error ? 'border-2 border-ink' : 'border-edge',
        )}
        {...select}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
      {error ? <p id={`${id}-error`} role="alert" className="mt-1 border-l-4 border-ink pl-2 text-sm font-semibold">{error}</p> : null}
    </div>
  );
}
