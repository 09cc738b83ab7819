import type { ReactNode } from 'react';
import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { ArrowLeft, ArrowRight, ZoomIn, ZoomOut } from 'lucide-react';
import type { ShredRow } from '../../../../server/contract/shred-lists.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { ErrorState, Skeleton } from '../../../components/ui/states.tsx';
import { paperQuery } from '../api/get-paper.ts';
import { describePlace, describeRow, describeTerm } from '../logic/words.ts';
import { PaperPage } from './paper-page.tsx';

interface PaperDialogProps {
  rows: readonly ShredRow[];
  /** The paper in view. */
  paper: string;
  onShow: (paper: string) => void;
  onLookedAt: (paper: string) => void;
  onClose: () => void;
  renderControl?: (row: ShredRow) => ReactNode;
}

/** One paper of the list, large, with all its pages; on to the next without going back. */
export function PaperDialog({
  rows,
  paper,
  onShow,
  onLookedAt,
  onClose,
  renderControl,
}: PaperDialogProps) {
  const at = rows.findIndex((row) => row.paper === paper);
  const row = rows[at];
  if (!row) return null;
  const previous = rows[at - 1];
  const next = rows[at + 1];
  return (
    <Dialog
      open
      onOpenChange={onClose}
      width="wide"
      title={describeRow(row)}
      description={
        <>
          <p>{describePlace(row)}</p>
          <p>{describeTerm(row)}</p>
        </>
      }
      footer={
        <div className="flex w-full flex-wrap items-center justify-between gap-3">
          <div className="flex items-center gap-2">
            <Button
              icon={<ArrowLeft aria-hidden />}
              disabled={!previous}
              aria-label="Paper before"
              onClick={() => previous && onShow(previous.paper)}
            />
            <span className="min-w-16 text-center text-sm text-ink-soft" aria-live="polite">
              {at + 1} of {rows.length}
            </span>
            <Button
              icon={<ArrowRight aria-hidden />}
              disabled={!next}
              aria-label="Next paper"
              onClick={() => next && onShow(next.paper)}
            />
          </div>
          {renderControl?.(row)}
        </div>
      }
    >
      <PaperPages key={row.paper} row={row} onLookedAt={() => onLookedAt(row.paper)} />
    </Dialog>
  );
}

function PaperPages({ row, onLookedAt }: { row: ShredRow; onLookedAt: () => void }) {
  const query = useQuery(paperQuery(row.paper));
  const [isLarge, setIsLarge] = useState(false);
  if (!query.data) {
    return query.error ? (
      <ErrorState error={query.error} what="this paper" onRetry={() => void query.refetch()} />
    ) : (
      <Skeleton className="mx-auto aspect-[1/1.41] w-full max-w-2xl" />
    );
  }
  const { pages } = query.data;
  if (pages.length === 0) {
    return (
      <p className="rounded-md bg-paper-sunk px-4 py-6 text-center text-ink-soft">
        This paper was described by hand; there is no picture of it. Ask to see the paper itself
        before it goes.
      </p>
    );
  }
  return (
    <>
      <div className="mb-3 flex items-center justify-between gap-3">
        <p className="text-sm text-ink-soft">
          {pages.length === 1 ? 'One page' : `${pages.length} pages, one under the other`}
        </p>
        <Button
          size="small"
          icon={isLarge ? <ZoomOut aria-hidden /> : <ZoomIn aria-hidden />}
          onClick={() => setIsLarge(!isLarge)}
        >
          {isLarge ? 'Smaller' : 'Larger'}
        </Button>
      </div>
      <div className="overflow-x-auto rounded-md bg-paper-sunk p-2 sm:p-4">
        {pages.map((page) => (
          <PaperPage
            key={page.id}
            page={page}
            pageCount={pages.length}
            isLarge={isLarge}
            onShown={onLookedAt}
          />
        ))}
      </div>
    </>
  );
}
