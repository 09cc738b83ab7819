import { useState } from 'react';
import { pageImageUrl, pageThumbnailUrl } from '../api/get-paper.ts';

interface PagePictureProps {
  pageId: string;
  alt: string;
  onShown: (pageId: string) => void;
}

/** The upright picture of a page over its small one; says when it is really there, and offers another try. */
export function PagePicture({ pageId, alt, onShown }: PagePictureProps) {
  const [state, setState] = useState<'loading' | 'shown' | 'failed'>('loading');
  const [tries, setTries] = useState(0);
  const url = pageImageUrl(pageId);
  return (
    <>
      {state !== 'shown' && (
        <img
          src={pageThumbnailUrl(pageId)}
          alt=""
          aria-hidden="true"
          draggable={false}
          className="absolute inset-0 h-full w-full opacity-60"
          onError={(event) => event.currentTarget.classList.add('invisible')}
        />
      )}
      {state !== 'failed' && (
        <img
          key={tries}
          src={tries === 0 ? url : `${url}?try=${tries}`}
          alt={alt}
          draggable={false}
          className="absolute inset-0 h-full w-full select-none"
          onLoad={() => {
            setState('shown');
            onShown(pageId);
          }}
          onError={() => setState('failed')}
        />
      )}
      {state === 'failed' && (
        <div
          role="alert"
          className="absolute inset-0 flex flex-col items-center justify-center gap-3 bg-paper-raised/90 p-6 text-center"
        >
          <p>The picture of this page did not come.</p>
          <button
            type="button"
            className="min-h-11 rounded border border-line-strong bg-paper-raised px-4 font-semibold text-teal"
            onClick={() => {
              setTries(tries + 1);
              setState('loading');
            }}
          >
            Try again
          </button>
        </div>
      )}
    </>
  );
}
