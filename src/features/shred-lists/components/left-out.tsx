import { Link } from 'react-router-dom';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { formatCount } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';

interface LeftOutProps {
  list: Pick<ShredList, 'householdId' | 'leftOut'>;
  /** Whether the person may look the paper up on the review desk. */
  mayReview: boolean;
  isOpen: boolean;
}

/** What was asked about and stays, with the reason: as important as what goes. */
export function LeftOut({ list, mayReview, isOpen }: LeftOutProps) {
  if (list.leftOut.length === 0) return null;
  return (
    <details open={isOpen} className="mt-8 rounded-lg border border-line bg-paper-raised">
      <summary className="min-h-11 px-4 py-2.5 font-semibold">
        Left out, and why: {formatCount(list.leftOut.length, 'paper')}
      </summary>
      <ul className="border-t border-line">
        {list.leftOut.map((entry) => (
          <li key={entry.paper} className="border-b border-line px-4 py-3 last:border-b-0">
            <p className="font-semibold">
              {mayReview ? (
                <Link
                  to={paths.review(list.householdId, entry.paper)}
                  className="text-teal-strong underline"
                >
                  Paper {entry.paperNumber}
                </Link>
              ) : (
                `Paper ${entry.paperNumber}`
              )}
              {`: ${[classLabel(entry.class), entry.issuer].filter(Boolean).join(', ')}`}
            </p>
            {entry.reasons.map((reason) => (
              <p key={reason.code + reason.sentence} className="text-sm text-ink-soft">
                {reason.sentence}
              </p>
            ))}
          </li>
        ))}
      </ul>
    </details>
  );
}
