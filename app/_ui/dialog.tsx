'use client';

import { Dialog as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';

interface DialogProps {
  readonly isOpen: boolean;
  readonly onOpenChange: (isOpen: boolean) => void;
  readonly title: string;
  readonly description?: string;
  readonly isWide?: boolean;
  readonly children: ReactNode;
}

/**
 * A question that wants an answer before work goes on; Escape leaves it. The backdrop is our own element: the
 * library's overlay writes a style element, which the content policy refuses.
 */
export function Dialog({ isOpen, onOpenChange, title, description, isWide = false, children }: DialogProps) {
  return (
    <Primitive.Root open={isOpen} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <div className="fixed inset-0 z-40 bg-ground/80" aria-hidden="true" />
        <Primitive.Content
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
          className={joinClasses(
            'fixed top-1/2 left-1/2 z-50 max-h-[92dvh] w-[calc(100vw-2rem)] -translate-x-1/2 -translate-y-1/2 overflow-y-auto',
            'rounded-md border border-edge bg-raised p-6 text-ink focus:outline-none',
            isWide ? 'max-w-3xl' : 'max-w-lg',
          )}
        >
          <Primitive.Title className="text-xl font-bold">{title}</Primitive.Title>
          {description === undefined ? null : (
            <Primitive.Description className="mt-1 text-second">{description}</Primitive.Description>
          )}
          <div className="mt-4">{children}</div>
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
