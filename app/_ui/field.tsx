import { useId, type ComponentProps, type ReactNode } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';
import { Kbd } from '@/app/_ui/kbd';

interface FieldProps extends Omit<ComponentProps<'input'>, 'id'> {
  readonly label: string;
  readonly isLabelHidden?: boolean;
  readonly unit?: string | undefined;
  readonly hint?: ReactNode;
  readonly error?: string | null | undefined;
  readonly hotkey?: string | null | undefined;
  /** Digits: monospaced, right-aligned, decimal keyboard. What was typed is kept as typed, also when it is wrong. */
  readonly isNumeric?: boolean;
}

/** One labelled input with its unit, its hint and the sentence that says what is wrong with the value. */
export function Field(props: FieldProps) {
  const { label, isLabelHidden = false, unit, hint, error, hotkey, isNumeric = false, className, ...input } = props;
  const id = useId();
  const describedBy = [unit ? `${id}-unit` : '', hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ');
  return (
    <div className={joinClasses('min-w-0', className)}>
      <label htmlFor={id} className={isLabelHidden ? 'sr-only' : 'mb-1 block text-sm text-second'}>
        {label}
      </label>
      <div
        className={joinClasses(
          'flex min-h-9 items-center rounded border bg-ground pointer-coarse:min-h-11',
          'focus-within:outline-2 focus-within:outline-offset-1 focus-within:outline-stain',
          error ? 'border-2 border-ink' : 'border-edge',
        )}
      >
        <input
          id={id}
          {...(isNumeric ? { inputMode: 'decimal' as const, autoComplete: 'off' } : {})}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy === '' ? undefined : describedBy}
          aria-keyshortcuts={hotkey ?? undefined}
          className={joinClasses('w-full min-w-0 bg-transparent px-2.5 py-1.5 outline-none', isNumeric && 'font-mono')}
          {...input}
        />
        {hotkey ? <span className="pr-2" aria-hidden="true"><Kbd>{hotkey}</Kbd></span> : null}
        {unit ? <span id={`${id}-unit`} className="pr-2.5 text-sm text-second">{unit}</span> : null}
      </div>
      {hint ? <p id={`${id}-hint`} className="mt-1 text-sm text-second">{hint}</p> : null}
      {error ? (
        <p id={`${id}-error`} role="alert" className="mt-1 border-l-4 border-ink pl-2 text-sm font-semibold text-ink">
          {error}
        </p>
      ) : null}
    </div>
  );
}
