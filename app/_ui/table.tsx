import type { ComponentProps } from 'react';

import { joinClasses } from '@/app/_ui/join-classes';

interface CellProps {
  /** A measured number or a time: monospaced and right-aligned, so that it stands under its neighbour. */
  readonly isNumeric?: boolean;
}

/** A table with its caption for those who do not see it; it scrolls sideways by itself on a narrow screen. */
export function Table({ caption, className, children, ...rest }: ComponentProps<'table'> & { readonly caption: string }) {
  return (
    <div className="overflow-x-auto" role="region" aria-label={`Table: ${caption}`} tabIndex={0}>
      <table className={joinClasses('w-full border-collapse text-left', className)} {...rest}>
        <caption className="sr-only">{caption}</caption>
        {children}
      </table>
    </div>
  );
}

/** A column's heading, with the unit of what stands below. */
export function HeadCell({ isNumeric = false, className, ...rest }: ComponentProps<'th'> & CellProps) {
  return (
    <th
      scope="col"
      className={joinClasses('border-b border-edge px-2.5 py-2 align-bottom text-sm font-normal whitespace-nowrap text-second', isNumeric && 'text-right', className)}
      {...rest}
    />
  );
}

/** One cell between hairlines. */
export function Cell({ isNumeric = false, className, ...rest }: ComponentProps<'td'> & CellProps) {
  return (
    <td
      className={joinClasses('border-b border-rule px-2.5 py-1.5 align-baseline', isNumeric && 'text-right font-mono whitespace-nowrap', className)}
      {...rest}
    />
  );
}
