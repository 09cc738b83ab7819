import { useState } from 'react';
import { Check, FileText } from 'lucide-react';
import type { ShredRow } from '../../../../server/contract/shred-lists.ts';
import { pageThumbnailUrl } from '../api/get-paper.ts';

interface RowThumbnailProps {
  row: Pick<ShredRow, 'firstPageId' | 'paperNumber'>;
  isLookedAt: boolean;
  onOpen: () => void;
}

/** The small picture of a row; pressing it shows the paper large. */
export function RowThumbnail({ row, isLookedAt, onOpen }: RowThumbnailProps) {
  const [isBroken, setIsBroken] = useState(false);
  const hasPicture = row.firstPageId !== null && !isBroken;
  return (
    <button
      type="button"
      onClick={onOpen}
      aria-label={`Look at paper ${row.paperNumber}${isLookedAt ? ', already looked at' : ''}`}
      className="relative flex h-28 w-20 shrink-0 items-center justify-center overflow-hidden rounded border border-line-strong bg-paper-sunk hover:border-teal sm:h-32 sm:w-24"
    >
      {hasPicture && row.firstPageId ? (
        <img
          src={pageThumbnailUrl(row.firstPageId)}
          alt=""
          loading="lazy"
          onError={() => setIsBroken(true)}
          className="h-full w-full object-cover object-top"
        />
      ) : (
        <span className="flex flex-col items-center gap-1 px-1 text-center text-xs text-ink-soft">
          <FileText aria-hidden className="size-6 text-ink-faint" />
          No picture
        </span>
      )}
      {isLookedAt ? (
        <span
          aria-hidden
          className="absolute right-1 bottom-1 flex size-6 items-center justify-center rounded-full bg-teal text-white"
        >
          <Check className="size-4" />
        </span>
      ) : null}
    </button>
  );
}
