import type { ReactNode } from 'react';

import { Cell, HeadCell, Table } from '@/app/_ui/table';

/** One column: its heading and whether numbers stand in it. */
export interface FactColumn {
  readonly heading: string;
  readonly isNumeric?: boolean;
}

interface FactsTableProps {
  readonly caption: string;
  readonly columns: readonly FactColumn[];
  readonly rows: readonly { readonly key: string; readonly cells: readonly ReactNode[] }[];
}

/** A plain table of the record. */
export function FactsTable({ caption, columns, rows }: FactsTableProps) {
  return (
    <Table caption={caption}>
      <thead>
        <tr>{columns.map(({ heading, isNumeric = false }) => <HeadCell key={heading} isNumeric={isNumeric}>{heading}</HeadCell>)}</tr>
      </thead>
      <tbody>
        {rows.map(({ key, cells }) => (
          <tr key={key}>
            {cells.map((cell, index) => <Cell key={columns[index]?.heading ?? index} isNumeric={columns[index]?.isNumeric === true} className={columns[index]?.isNumeric === true ? undefined : 'min-w-32'}>{cell}</Cell>)}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
