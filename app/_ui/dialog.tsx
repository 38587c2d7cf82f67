'use client';

import { Dialog as Primitive } from 'radix-ui';
import { useState, type ReactNode } from 'react';

import { returnFocus } from '@/app/_ui/focus-home';
import { joinClasses } from '@/app/_ui/join-classes';
import { stopHeldEnter } from '@/app/_ui/stop-held-enter';

interface DialogProps {
  readonly isOpen: boolean;
  readonly onOpenChange: (isOpen: boolean) => void;
  readonly title: string;
  readonly description?: string;
  readonly isWide?: boolean;
  /** Where it stands and how wide it may be; the middle of the window unless said otherwise. */
  readonly placeClasses?: string;
  readonly children: ReactNode;
}

/** A question that wants an answer before work goes on; Escape leaves it, and the focus goes back to where it was. */
export function Dialog({ isOpen, onOpenChange, ...rest }: DialogProps) {
  return (
    <Primitive.Root open={isOpen} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <OpenDialog {...rest} />
      </Primitive.Portal>
    </Primitive.Root>
  );
}

/**
 * What stands on the page while a dialog is open. The backdrop is our own element: the library's overlay writes a style
 * element, which the content policy refuses. What must stay readable above it has a z-index between 40 and 50.
 */
function OpenDialog({ title, description, isWide = false, placeClasses = 'left-1/2 w-[calc(100vw-2rem)]', children }: Omit<DialogProps, 'isOpen' | 'onOpenChange'>) {
  // Read while drawing: a field of the dialog takes the focus before any effect runs.
  const [before] = useState(() => (typeof document === 'undefined' ? null : document.activeElement));
  return (
    <>
      <div className="fixed inset-0 z-40 bg-ground/80" aria-hidden="true" />
      <Primitive.Content
        {...(description === undefined ? { 'aria-describedby': undefined } : {})}
        onKeyDown={stopHeldEnter}
        onCloseAutoFocus={(event) => {
          event.preventDefault();
          returnFocus(before);
        }}
        className={joinClasses(
          'fixed top-1/2 z-50 max-h-[92dvh] -translate-x-1/2 -translate-y-1/2 overflow-y-auto',
          'rounded-md border border-edge bg-raised p-6 text-ink focus:outline-none',
          placeClasses,
          isWide ? 'max-w-3xl' : 'max-w-lg',
        )}
      >
        <Primitive.Title className="text-xl font-bold">{title}</Primitive.Title>
        {description === undefined ? null : <Primitive.Description className="mt-1 text-second">{description}</Primitive.Description>}
        <div className="mt-4">{children}</div>
      </Primitive.Content>
    </>
  );
}
