'use client';

import { useId, useRef, type FormEvent, type KeyboardEvent } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';

interface NumericInputProps {
  readonly label: string;
  readonly isLabelShown?: boolean;
  readonly name: string;
  readonly value: string;
  readonly unit?: string;
  readonly placeholder?: string;
  readonly error?: string | undefined;
  /** Where the sentence stands when the field has no room for it below itself. */
  readonly errorId?: string;
  readonly onType: (typed: string) => void;
  readonly onFocus?: () => void;
  readonly className?: string;
}

/**
 * A field for one number: digits, point and minus only; a comma becomes a point. From the first digit until it is left
 * it counts as half typed, so that no letter key acts by mistake.
 */
export function NumericInput({ label, isLabelShown = false, name, value, unit, placeholder, error, errorId, onType, onFocus, className }: NumericInputProps) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  const mark = (isHalfTyped: boolean) => {
    if (input.current !== null) input.current.dataset['halfTyped'] = isHalfTyped ? 'yes' : 'no';
  };
  const handleKey = (event: KeyboardEvent) => {
    if (event.key.length === 1 && !event.ctrlKey && !event.metaKey && !/[0-9.,-]/.test(event.key)) event.preventDefault();
  };
  const handleInput = (event: FormEvent<HTMLInputElement>) => {
    const typed = event.currentTarget.value.replace(',', '.').slice(0, 12);
    mark(typed !== '');
    onType(typed);
  };
  return (
    <div className={joinClasses('min-w-0', className)}>
      <label htmlFor={id} className={isLabelShown ? 'mb-1 block text-sm text-second' : 'sr-only'}>{label}</label>
      <div
        className={joinClasses(
          'flex min-h-9 items-center rounded border bg-ground pointer-coarse:min-h-11',
          'focus-within:outline-2 focus-within:outline-offset-1 focus-within:outline-stain',
          error ? 'border-2 border-ink' : 'border-edge',
        )}
      >
        <input
          ref={input}
          id={id}
          name={name}
          data-numeric="yes"
          data-field={name}
          inputMode="decimal"
          autoComplete="off"
          value={value}
          placeholder={placeholder}
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? (errorId ?? `${id}-error`) : undefined}
          onKeyDown={handleKey}
          onChange={handleInput}
          onFocus={(event) => {
            mark(false);
            event.currentTarget.select();
            onFocus?.();
          }}
          onBlur={() => mark(false)}
          className="w-full min-w-0 bg-transparent px-2.5 py-1.5 font-mono outline-none"
        />
        {unit === undefined ? null : <span className="pr-2.5 text-sm text-second">{unit}</span>}
      </div>
      {error === undefined || errorId !== undefined ? null : <p id={`${id}-error`} role="alert" className="mt-1 max-w-80 border-l-4 border-ink pl-2 text-sm font-semibold">{error}</p>}
    </div>
  );
}
