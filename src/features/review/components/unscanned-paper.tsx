import { FileText } from 'lucide-react';
import type { Paper } from '../../../../server/contract/papers.ts';
import { formatCount, formatDay } from '../../../lib/format.ts';

/** A paper or bundle that was described by hand: there is no page to show. */
export function UnscannedPaper({ paper }: { paper: Paper }) {
  const span = [paper.bundleFrom, paper.bundleTo].map((day) => (day ? formatDay(day) : '…'));
  return (
    <section
      aria-label="The paper"
      className="flex h-full min-h-48 flex-col items-center justify-center gap-2 rounded bg-paper-sunk p-6 text-center"
    >
      <FileText aria-hidden size={36} className="text-ink-faint" />
      <p className="text-lg font-semibold">{paper.title ?? 'Entered without a scan'}</p>
      <p className="text-ink-soft">
        {paper.bundle ? 'A bundle' : 'One paper'} of {formatCount(paper.sheets, 'sheet')}, entered
        without a scan. Have it in your hand when you decide.
      </p>
      {(paper.bundleFrom ?? paper.bundleTo) && (
        <p className="tabular-nums">
          {span[0]} to {span[1]}
        </p>
      )}
    </section>
  );
}
