import type { Paper } from '../../../../server/contract/papers.ts';
import { joinClasses } from '../../../lib/join-classes.ts';
import { pageThumbnailUrl } from '../api/get-paper.ts';

interface PageStripProps {
  pages: Paper['pages'];
  shownIndex: number;
  onShow: (pageIndex: number) => void;
}

/** All pages of the paper in small, so that none goes unnoticed. */
export function PageStrip({ pages, shownIndex, onShow }: PageStripProps) {
  return (
    <ol aria-label="Pages" className="flex shrink-0 gap-2 overflow-x-auto px-1 pt-2 pb-1">
      {pages.map((page, index) => (
        <li key={page.id} className="shrink-0">
          <button
            type="button"
            aria-label={`Page ${page.number}${page.blank ? ', blank' : ''}`}
            aria-current={index === shownIndex ? 'page' : undefined}
            onClick={() => onShow(index)}
            className={joinClasses(
              'flex h-16 w-12 items-center justify-center overflow-hidden rounded border-2 bg-paper-raised',
              index === shownIndex ? 'border-teal' : 'border-line',
            )}
          >
            <img
              src={pageThumbnailUrl(page.id)}
              alt=""
              loading="lazy"
              className="max-h-full max-w-full"
            />
          </button>
        </li>
      ))}
    </ol>
  );
}
