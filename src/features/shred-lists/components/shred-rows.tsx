import type { ReactNode } from 'react';
import type { ShredRow } from '../../../../server/contract/shred-lists.ts';
import { ShredRowItem } from './shred-row-item.tsx';

interface ShredRowsProps {
  rows: readonly ShredRow[];
  lookedAt: ReadonlySet<string>;
  keepBack?: ReadonlySet<string>;
  onOpen: (paper: string) => void;
  renderControl?: (row: ShredRow) => ReactNode;
}

const none: ReadonlySet<string> = new Set();

/** The papers on a list, in the order in which they lie. */
export function ShredRows({
  rows,
  lookedAt,
  keepBack = none,
  onOpen,
  renderControl,
}: ShredRowsProps) {
  return (
    <ul
      aria-label="Papers on the list"
      className="overflow-hidden rounded-lg border border-line bg-paper-raised"
    >
      {rows.map((row) => (
        <ShredRowItem
          key={row.paper}
          row={row}
          isLookedAt={lookedAt.has(row.paper)}
          stays={row.keptBack || keepBack.has(row.paper)}
          onOpen={() => onOpen(row.paper)}
          control={renderControl?.(row)}
        />
      ))}
    </ul>
  );
}
