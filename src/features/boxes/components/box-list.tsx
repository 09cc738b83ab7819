import { Link } from 'react-router-dom';
import type { BoxRecord } from '../../../../server/contract/boxes.ts';
import { Badge } from '../../../components/ui/badge.tsx';
import { formatCount } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';

/** The boxes of a household, each a door. */
export function BoxList({ boxes }: { boxes: BoxRecord[] }) {
  return (
    <ul className="divide-y divide-line overflow-hidden rounded-lg border border-line bg-paper-raised">
      {boxes.map((box) => (
        <li key={box.id}>
          <Link
            to={paths.box(box.id)}
            className="flex min-h-16 flex-wrap items-center gap-x-5 gap-y-1 px-4 py-3 hover:bg-paper"
          >
            <span className="w-14 text-lg font-semibold tabular-nums">{box.code}</span>
            <span className="min-w-40 flex-1">
              <span className="font-semibold">{box.label || 'Box'}</span>
              {box.areaName ? <span className="text-ink-soft"> · {box.areaName}</span> : null}
            </span>
            <span className="flex flex-wrap items-center gap-2 text-sm text-ink-soft">
              <BoxState box={box} />
            </span>
          </Link>
        </li>
      ))}
    </ul>
  );
}

function BoxState({ box: { counts } }: { box: BoxRecord }) {
  if (counts.scans === 0 && counts.papers === 0) return <>empty so far</>;
  return (
    <>
      <span className="tabular-nums">{formatCount(counts.papers, 'paper')}</span>
      {counts.reading > 0 ? <Badge tone="soon">being read</Badge> : null}
      {counts.failed > 0 ? <Badge tone="soon">{counts.failed} not readable</Badge> : null}
      {counts.toReview > 0 ? <Badge tone="good">{counts.toReview} to look at</Badge> : null}
    </>
  );
}
