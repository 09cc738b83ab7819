import { useState } from 'react';
import type { Paper } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { joinClasses } from '../../../lib/join-classes.ts';
import { pageImageUrl } from '../api/get-paper.ts';

interface PaperPageProps {
  page: Paper['pages'][number];
  pageCount: number;
  isLarge: boolean;
  onShown: () => void;
}

/** The upright picture of one page in a frame of its own shape, so that nothing jumps when it comes. */
export function PaperPage({ page, pageCount, isLarge, onShown }: PaperPageProps) {
  const [tries, setTries] = useState(0);
  const [isBroken, setIsBroken] = useState(false);
  const url = pageImageUrl(page.id);
  return (
    <div
      className={joinClasses(
        'relative mx-auto mb-3 bg-paper-raised shadow-md last:mb-0',
        isLarge ? 'w-[180%]' : 'w-full max-w-2xl',
      )}
      style={{ aspectRatio: `${Math.max(1, page.width)} / ${Math.max(1, page.height)}` }}
    >
      {isBroken ? (
        <div
          role="alert"
          className="absolute inset-0 flex flex-col items-center justify-center gap-3 p-6 text-center"
        >
          <p>The picture of this page did not come.</p>
          <Button
            onClick={() => {
              setTries(tries + 1);
              setIsBroken(false);
            }}
          >
            Try again
          </Button>
        </div>
      ) : (
        <img
          src={tries === 0 ? url : `${url}?try=${tries}`}
          alt={`Page ${page.number} of ${pageCount}`}
          loading={page.number > 2 ? 'lazy' : 'eager'}
          onLoad={onShown}
          onError={() => setIsBroken(true)}
          className="absolute inset-0 h-full w-full"
        />
      )}
    </div>
  );
}
