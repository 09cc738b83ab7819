import type { Scan } from '../../../../server/contract/scans.ts';
import { Badge } from '../../../components/ui/badge.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { formatCount } from '../../../lib/format.ts';
import { ProgressBar } from './progress-bar.tsx';

/** The scans of a box and how far reading got. */
export function ScanList({
  scans,
  mayRetry,
  retrying,
  onRetry,
}: {
  scans: Scan[];
  mayRetry: boolean;
  /** The scan whose retry is under way. */
  retrying: string | null;
  onRetry: (scanId: string) => void;
}) {
  return (
    <ul className="divide-y divide-line rounded-lg border border-line bg-paper-raised">
      {scans.map((scan) => (
        <li key={scan.id} className="flex flex-wrap items-center gap-x-4 gap-y-1 px-4 py-3">
          <span className="min-w-0 flex-1 basis-52 truncate">{scan.name}</span>
          <ScanState scan={scan} />
          {scan.status === 'failed' && mayRetry ? (
            <Button
              size="small"
              busy={retrying === scan.id}
              aria-label={`Read ${scan.name} again`}
              onClick={() => onRetry(scan.id)}
            >
              Read it again
            </Button>
          ) : null}
          {scan.reason ? <p className="basis-full text-sm text-ink-soft">{scan.reason}</p> : null}
        </li>
      ))}
    </ul>
  );
}

function ScanState({ scan }: { scan: Scan }) {
  switch (scan.status) {
    case 'waiting':
      return <Badge>waits to be read</Badge>;
    case 'reading':
      return (
        <span className="flex items-center gap-3 text-sm text-ink-soft">
          {scan.pages === null
            ? 'opening'
            : `${scan.pagesRead} of ${formatCount(scan.pages, 'page')}`}
          <ProgressBar
            label={`Reading ${scan.name}`}
            share={scan.pages ? scan.pagesRead / scan.pages : 0}
          />
        </span>
      );
    case 'failed':
      return <Badge tone="soon">not readable</Badge>;
    case 'read':
      return (
        <span className="text-sm text-ink-soft tabular-nums">
          {formatCount(scan.papers, 'paper')} on {formatCount(scan.pages ?? 0, 'page')}
          {scan.blankPages > 0 ? `, ${scan.blankPages} blank` : ''}
        </span>
      );
  }
}
