import type { PaperRow } from '../../../../server/contract/papers.ts';
import { Badge } from '../../../components/ui/badge.tsx';
import { formatDay } from '../../../lib/format.ts';
import { describeStayAlone, statusWords } from '../logic/words.ts';
import { PaperName } from './paper-name.tsx';

/** The register on a phone: one paper below the other. */
export function RegisterCards({ rows }: { rows: PaperRow[] }) {
  return (
    <ul className="divide-y divide-line rounded-lg border border-line bg-paper-raised">
      {rows.map((row) => (
        <li key={row.id} className="px-4 py-3">
          <div className="flex items-start justify-between gap-3">
            <div className="min-w-0">
              <PaperName paper={row} />
            </div>
            <span className="shrink-0 text-sm text-ink-soft tabular-nums">
              {row.boxCode ? `${row.boxCode} · ` : ''}no. {row.number}
            </span>
          </div>
          <p className="text-sm text-ink-soft">
            {[row.issuer, row.paperOn ? formatDay(row.paperOn) : null].filter(Boolean).join(', ')}
          </p>
          <p className="mt-1.5 flex flex-wrap items-center gap-2 text-sm">
            <Badge tone={row.held ? 'hold' : row.status === 'to-review' ? 'good' : 'neutral'}>
              {statusWords[row.status]}
            </Badge>
            <span className="text-ink-soft">{describeStayAlone(row)}</span>
          </p>
        </li>
      ))}
    </ul>
  );
}
