import type { ComponentProps } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';
import { Kbd } from '@/app/_ui/kbd';
import { stopHeldEnter } from '@/app/_ui/stop-held-enter';

export type ButtonVariant = 'primary' | 'quiet' | 'danger' | 'plain';

const variantClasses: Record<ButtonVariant, string> = {
  primary: 'border border-stain bg-stain text-on-stain font-bold hover:brightness-110',
  quiet: 'border border-edge text-ink font-semibold hover:bg-raised-more',
  // Red is for alerts only: what cannot be taken back is heavier, not redder.
  danger: 'border-2 border-ink text-ink font-bold hover:bg-ink hover:text-ground',
  plain: 'border border-transparent text-stain font-semibold underline underline-offset-4 hover:border-edge',
};

interface ButtonProps extends ComponentProps<'button'> {
  readonly variant?: ButtonVariant;
  /** The hotkey that does the same, shown on the control. */
  readonly hotkey?: string | null | undefined;
  readonly isWide?: boolean;
}

/** A control that does one thing, named by its words; a held Enter presses it once. `type` is "button" unless said otherwise. */
export function Button({ variant = 'quiet', hotkey, isWide = false, className, children, type = 'button', ...rest }: ButtonProps) {
  return (
    <button
      type={type}
      onKeyDown={stopHeldEnter}
      aria-keyshortcuts={hotkey ?? undefined}
      className={joinClasses(
        'inline-flex min-h-9 items-center gap-2.5 rounded px-3.5 py-1.5 text-base leading-5 pointer-coarse:min-h-11',
        'disabled:cursor-not-allowed disabled:border-rule disabled:bg-transparent disabled:text-third disabled:no-underline',
        isWide ? 'w-full justify-between' : 'justify-center',
        variantClasses[variant],
        className,
      )}
      {...rest}
    >
      <span>{children}</span>
      {hotkey ? <span aria-hidden="true"><Kbd>{hotkey}</Kbd></span> : null}
    </button>
  );
}
