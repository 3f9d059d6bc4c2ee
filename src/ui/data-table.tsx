// A table from a list of columns: numbers right, no zebra; on a phone each row becomes a block with name left and money right.
import clsx from 'clsx';
import type { ReactNode } from 'react';

export interface Column<Row> {
  readonly head: string;
  readonly cell: (row: Row) => ReactNode;
  readonly number?: boolean;
  /**
   * Where the cell stands on a phone: `name` top left, `amount` top right, `under` below (the usual), `labelled` below
   * with its head in front, `hidden` not at all.
   */
  readonly phone?: 'name' | 'amount' | 'under' | 'labelled' | 'hidden';
  /** The head is for a reader only (photos, buttons). */
  readonly headHidden?: boolean;
}

/** `held` holds money, `attention` needs something, `proved` is done. */
export type RowTone = 'held' | 'attention' | 'proved';

interface DataTableProps<Row> {
  /** Says what the table holds; read out, not shown. */
  readonly caption: string;
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  readonly rowTone?: (row: Row) => RowTone | undefined;
  /** The last row that adds up: one node for each column it fills, `undefined` for an empty cell. */
  readonly sum?: readonly ReactNode[];
  /** Keeps the table a table on a phone, in a box that scrolls. */
  readonly keepOnPhone?: boolean;
}

const ROLES = {
  // A browser forgets that a row is a row once CSS lays it out as a block, so the roles are said aloud.
  table: { role: 'table' },
  group: { role: 'rowgroup' },
  row: { role: 'row' },
  head: { role: 'columnheader' },
  cell: { role: 'cell' },
} as const;

function cellClass<Row>(column: Column<Row> | undefined): string {
  return clsx(
    column?.number && 'table-number',
    column?.phone === 'name' && 'table-name',
    column?.phone === 'amount' && 'table-amount',
    column?.phone === 'hidden' && 'table-desk-only',
  );
}

export function DataTable<Row>(props: DataTableProps<Row>) {
  const { caption, columns, rows, rowKey, rowTone, sum, keepOnPhone = false } = props;
  const table = (
    <table {...ROLES.table} className={clsx('table', !keepOnPhone && 'table-blocks')}>
      <caption className="vh">{caption}</caption>
      <thead {...ROLES.group}>
        <tr {...ROLES.row}>
          {columns.map((column) => (
            <th {...ROLES.head} key={column.head} scope="col" className={cellClass(column)}>
              {column.headHidden ? <span className="vh">{column.head}</span> : column.head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody {...ROLES.group}>
        {rows.map((row) => {
          const tone = rowTone?.(row);
          return (
            <tr {...ROLES.row} key={rowKey(row)} className={tone && `table-${tone}`}>
              {columns.map((column) => (
                <td
                  {...ROLES.cell}
                  key={column.head}
                  className={cellClass(column)}
                  data-head={column.phone === 'labelled' ? column.head : undefined}
                >
                  {column.cell(row)}
                </td>
              ))}
            </tr>
          );
        })}
      </tbody>
      {sum && (
        <tfoot {...ROLES.group}>
          <tr {...ROLES.row}>
            {columns.map((column, index) => (
              <td {...ROLES.cell} key={column.head} className={cellClass(column)}>
                {sum[index]}
              </td>
            ))}
          </tr>
        </tfoot>
      )}
    </table>
  );
  if (!keepOnPhone) return table;
  return (
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a box that scrolls sideways must be reachable by keyboard
    <div className="table-scroll" role="region" aria-label={caption} tabIndex={0}>
      {table}
    </div>
  );
}
