import { useTable } from '@tanstack/react-table';
import type { PaperRow } from '../../../../server/contract/papers.ts';
import { Cell, HeadCell, Row, Table } from '../../../components/ui/table.tsx';
import { nextSort } from '../logic/filters.ts';
import type { ColumnVisibility } from '../logic/use-columns.ts';
import { columns, features, unsortable } from './register-columns.tsx';

/** The register as a table: the server sorts and pages, the person chooses the columns. */
export function RegisterTable({
  rows,
  visibility,
  sort,
  onSort,
}: {
  rows: PaperRow[];
  visibility: ColumnVisibility;
  sort: string;
  onSort: (sort: string) => void;
}) {
  const table = useTable({
    features,
    columns,
    data: rows,
    state: { columnVisibility: visibility },
    getRowId: (row) => row.id,
  });
  const directionOf = (id: string) =>
    sort === id ? ('asc' as const) : sort === `-${id}` ? ('desc' as const) : (false as const);
  return (
    <Table caption="All papers">
      <thead>
        {table.getHeaderGroups().map((group) => (
          <tr key={group.id}>
            {group.headers.map((header) => (
              <HeadCell
                key={header.id}
                sorted={directionOf(header.column.id)}
                {...(unsortable.has(header.column.id)
                  ? {}
                  : { onSort: () => onSort(nextSort(sort, header.column.id)) })}
              >
                <table.FlexRender header={header} />
              </HeadCell>
            ))}
          </tr>
        ))}
      </thead>
      <tbody>
        {table.getRowModel().rows.map((row) => (
          <Row key={row.id}>
            {row.getVisibleCells().map((cell) => (
              <Cell key={cell.id} className="tabular-nums">
                <table.FlexRender cell={cell} />
              </Cell>
            ))}
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
