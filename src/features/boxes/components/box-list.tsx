import { ChevronRight } from 'lucide-react';
import { Link } from 'react-router-dom';
import type { BoxRecord } from '../../../../server/contract/boxes.ts';
import { Badge } from '../../../components/ui/badge.tsx';
import { formatCount } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';

/** The boxes of a household, each with how far it is. */
export function BoxList({ boxes }: { boxes: readonly BoxRecord[] }) {
  return (
    <ul className="divide-y divide-line overflow-hidden rounded-lg border border-line bg-paper-raised">
      {boxes.map((box) => (
        <li key={box.id}>
          <Link
            to={paths.box(box.id)}
            className="flex items-center gap-4 px-4 py-3.5 no-underline hover:bg-teal-wash/50 focus-visible:-outline-offset-2 sm:px-5"
          >
            <span className="w-14 shrink-0 text-lg font-semibold">{box.code}</span>
            <span className="min-w-0 flex-1">
              <span className="block font-semibold">{box.label || 'Box without a name'}</span>
              <span className="block text-sm text-ink-soft">
                {[
                  box.areaName,
                  formatCount(box.counts.pages, 'page'),
                  formatCount(box.counts.papers, 'paper'),
                ]
                  .filter(Boolean)
                  .join(' · ')}
              </span>
            </span>
            <span className="flex flex-wrap justify-end gap-1.5">
              {box.counts.reading > 0 ? <Badge>{box.counts.reading} being read</Badge> : null}
              {box.counts.failed > 0 ? (
                <Badge tone="soon">{box.counts.failed} not read</Badge>
              ) : null}
              {box.counts.toReview > 0 ? (
                <Badge tone="good">{box.counts.toReview} to look at</Badge>
              ) : null}
            </span>
            <ChevronRight aria-hidden className="size-5 shrink-0 text-ink-faint" />
          </Link>
        </li>
      ))}
    </ul>
  );
}
