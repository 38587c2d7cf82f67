'use client';

import { useId, type KeyboardEvent } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';
import { Kbd } from '@/app/_ui/kbd';

interface ChoiceOption<Value extends string> {
  readonly value: Value;
  readonly label: string;
  readonly hint?: string;
}

interface ChoiceProps<Value extends string> {
  readonly legend: string;
  readonly isLegendHidden?: boolean;
  readonly options: readonly ChoiceOption<Value>[];
  readonly value: Value | null;
  readonly onChoose: (value: Value) => void;
  readonly isStacked?: boolean;
  readonly error?: string | null | undefined;
}

/** One of a few. While it has the focus, the digit on an option chooses it. */
export function Choice<Value extends string>(props: ChoiceProps<Value>) {
  const { legend, isLegendHidden = false, options, value, onChoose, isStacked = false, error } = props;
  const name = useId();
  const handleKey = (event: KeyboardEvent) => {
    const option = /^[1-9]$/.test(event.key) && !event.ctrlKey && !event.metaKey && !event.altKey ? options[Number(event.key) - 1] : undefined;
    if (option === undefined) return;
    event.preventDefault();
    event.stopPropagation();
    onChoose(option.value);
  };
  return (
    <fieldset onKeyDown={handleKey} aria-describedby={error ? `${name}-error` : undefined}>
      <legend className={isLegendHidden ? 'sr-only' : 'mb-1 text-sm text-second'}>{legend}</legend>
      <div className={joinClasses('flex gap-1.5', isStacked ? 'flex-col' : 'flex-wrap')}>
        {options.map((option, index) => (
          <label
            key={option.value}
            className={joinClasses(
              'flex min-h-9 items-center gap-2.5 rounded border px-3 py-1 pointer-coarse:min-h-11',
              'has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-stain',
              option.value === value ? 'border-stain bg-raised-more font-semibold' : 'border-edge hover:bg-raised-more',
            )}
          >
            <input
              type="radio"
              name={name}
              value={option.value}
              checked={option.value === value}
              onChange={() => onChoose(option.value)}
              className="size-4 accent-stain outline-none"
            />
            <span className="flex-1">
              {option.label}
              {option.hint ? <span className="block text-sm font-normal text-second">{option.hint}</span> : null}
            </span>
            {index < 9 ? <span className="text-second" aria-hidden="true"><Kbd>{String(index + 1)}</Kbd></span> : null}
          </label>
        ))}
      </div>
      {error ? <p id={`${name}-error`} role="alert" className="mt-1 border-l-4 border-ink pl-2 text-sm font-semibold">{error}</p> : null}
    </fieldset>
  );
}
