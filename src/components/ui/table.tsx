import type { ComponentProps, ReactNode } from 'react';
import { ArrowDown, ArrowUp, ArrowUpDown } from 'lucide-react';
import { joinClasses } from '../../lib/join-classes.ts';

interface TableProps extends ComponentProps<'table'> {
  /** What the table shows; for those who listen unless `showCaption`. */
  caption: string;
  showCaption?: boolean;
}

/** A region that scrolls has to be reached by keyboard, or its far end is not. */
const reachableByKeyboard = { tabIndex: 0 };

/** A table that scrolls sideways by itself rather than moving the screen. */
export function Table({ caption, showCaption = false, className, children, ...rest }: TableProps) {
  return (
    <div
      {...reachableByKeyboard}
      role="region"
      aria-label={caption}
      className="overflow-x-auto rounded-lg border border-line bg-paper-raised"
    >
      <table {...rest} className={joinClasses('w-full border-collapse text-left', className)}>
        <caption className={showCaption ? 'px-3 py-2 text-left font-semibold' : 'sr-only'}>
          {caption}
        </caption>
        {children}
      </table>
    </div>
  );
}

type Direction = 'asc' | 'desc' | false;

interface HeadCellProps extends ComponentProps<'th'> {
  /** With `onSort` the heading is a button. */
  sorted?: Direction;
  onSort?: () => void;
}

/** A column's heading. */
export function HeadCell({ sorted = false, onSort, className, children, ...rest }: HeadCellProps) {
  const Icon = sorted === 'asc' ? ArrowUp : sorted === 'desc' ? ArrowDown : ArrowUpDown;
  return (
    <th
      {...rest}
      scope="col"
      aria-sort={sorted === 'asc' ? 'ascending' : sorted === 'desc' ? 'descending' : undefined}
      className={joinClasses(
        'border-b border-line bg-paper-sunk text-sm font-semibold whitespace-nowrap text-ink-soft',
        onSort ? 'p-0' : 'px-3 py-2',
        className,
      )}
    >
      {onSort ? (
        <button
          type="button"
          onClick={onSort}
          className="flex min-h-11 w-full items-center gap-1.5 px-3 py-2 text-left hover:text-ink"
        >
          {children}
          <Icon aria-hidden className={joinClasses('size-3.5', !sorted && 'opacity-40')} />
        </button>
      ) : (
        children
      )}
    </th>
  );
}

/** A row; the line under it keeps the eye on it. */
export function Row({ className, ...rest }: ComponentProps<'tr'>) {
  return (
    <tr
      {...rest}
      className={joinClasses('border-b border-line last:border-b-0 hover:bg-paper', className)}
    />
  );
}

/** A cell. */
export function Cell({ className, ...rest }: ComponentProps<'td'>) {
  return <td {...rest} className={joinClasses('px-3 py-2.5 align-top', className)} />;
}

/** Forward and back through a long list. */
export function Pager({
  page,
  pageSize,
  total,
  onPage,
  children,
}: {
  page: number;
  pageSize: number;
  total: number;
  onPage: (page: number) => void;
  children?: ReactNode;
}) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  if (pages === 1) return null;
  const step =
    'min-h-11 rounded-md border border-line-strong bg-paper-raised px-4 font-semibold hover:bg-paper-sunk disabled:opacity-50';
  return (
    <nav aria-label="Pages" className="flex flex-wrap items-center justify-between gap-3 py-4">
      <button type="button" className={step} disabled={page <= 1} onClick={() => onPage(page - 1)}>
        Back
      </button>
      <p aria-live="polite" className="text-ink-soft">
        Page {page} of {pages}
      </p>
      {children}
      <button
        type="button"
        className={step}
        disabled={page >= pages}
        onClick={() => onPage(page + 1)}
      >
        Next
      </button>
    </nav>
  );
}
