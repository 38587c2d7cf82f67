'use client';

import { useId, type ComponentProps, type KeyboardEvent } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';

interface TextAreaProps extends Omit<ComponentProps<'textarea'>, 'id'> {
  readonly label: string;
  readonly error?: string | null | undefined;
}

/** A sentence or two, shown whole. Enter sends the form as in a field of one line; with Shift it begins a new line. */
export function TextArea({ label, error, className, ...area }: TextAreaProps) {
  const id = useId();
  const handleKey = (event: KeyboardEvent<HTMLTextAreaElement>) => {
    if (event.key !== 'Enter' || event.shiftKey || event.nativeEvent.isComposing) return;
    event.preventDefault();
    if (!event.repeat) event.currentTarget.form?.requestSubmit();
  };
  return (
    <div className={joinClasses('min-w-0', className)}>
      <label htmlFor={id} className="mb-1 block text-sm text-second">{label}</label>
      <textarea
        id={id}
        rows={3}
        aria-invalid={error ? true : undefined}
        aria-describedby={error ? `${id}-error` : undefined}
        onKeyDown={handleKey}
        className={joinClasses('block w-full resize-none rounded border bg-ground px-2.5 py-1.5 field-sizing-content min-h-18', error ? 'border-2 border-ink' : 'border-edge')}
        {...area}
      />
      {error ? <p id={`${id}-error`} role="alert" className="mt-1 border-l-4 border-ink pl-2 text-sm font-semibold">{error}</p> : null}
    </div>
  );
}
