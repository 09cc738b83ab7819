import type { ReactNode } from 'react';
import type { ShredRow } from '../../../../server/contract/shred-lists.ts';
import { Badge } from '../../../components/ui/badge.tsx';
import { joinClasses } from '../../../lib/join-classes.ts';
import { describePlace, describeRow, describeTerm, outcomeWords } from '../logic/words.ts';
import { RowThumbnail } from './row-thumbnail.tsx';

interface ShredRowItemProps {
  row: ShredRow;
  isLookedAt: boolean;
  /** Stays in the household: shown paler, and the reason it is on the list no longer matters. */
  stays: boolean;
  onOpen: () => void;
  /** What may be done with the row here. */
  control?: ReactNode;
}

/** One paper of a list: its small picture, what it is, why it may go, and what can be done about it. */
export function ShredRowItem({ row, isLookedAt, stays, onOpen, control }: ShredRowItemProps) {
  return (
    <li
      className={joinClasses(
        'flex gap-4 border-b border-line p-3 last:border-b-0 sm:p-4',
        stays && 'bg-teal-wash/50',
      )}
    >
      <RowThumbnail row={row} isLookedAt={isLookedAt} onOpen={onOpen} />
      <div className="flex min-w-0 flex-1 flex-col gap-x-6 gap-y-2 md:flex-row md:justify-between">
        <div className="min-w-0">
          <h3 className="font-semibold">
            {describeRow(row)}
            {row.outcome ? <OutcomeBadge outcome={row.outcome} /> : null}
            {!row.outcome && row.keptBack ? (
              <Badge tone="good" className="ml-2">
                Stays
              </Badge>
            ) : null}
          </h3>
          <p className="text-sm text-ink-soft">{describePlace(row)}</p>
          <p className="text-sm text-ink-soft">{describeTerm(row)}</p>
          {row.securityLevel ? (
            <p className="text-sm text-ink-soft">Shredder level {row.securityLevel} or finer</p>
          ) : null}
          {row.keptBack && row.keptBackReason ? (
            <p className="text-sm text-teal-strong">{row.keptBackReason}</p>
          ) : null}
          {row.blocked.map((reason) => (
            <p
              key={reason.code + reason.sentence}
              className={joinClasses(
                'mt-1 border-l-4 pl-2 text-sm font-semibold',
                reason.code === 'held'
                  ? 'border-violet text-violet-strong'
                  : 'border-amber text-amber-strong',
              )}
            >
              May not go now: {reason.sentence}
            </p>
          ))}
        </div>
        {control ? <div className="shrink-0 md:pt-0.5">{control}</div> : null}
      </div>
    </li>
  );
}

function OutcomeBadge({ outcome }: { outcome: NonNullable<ShredRow['outcome']> }) {
  const tone = { destroyed: 'danger', 'kept-back': 'good', 'not-found': 'soon' } as const;
  return (
    <Badge tone={tone[outcome]} className="ml-2">
      {outcomeWords[outcome]}
    </Badge>
  );
}
