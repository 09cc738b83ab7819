import { ChevronRight } from 'lucide-react';
import { Link } from 'react-router-dom';
import type { Household } from '../../../../server/contract/households.ts';
import { formatCountry, formatCount } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';

function describeWaiting({ counts }: Household): string {
  const parts = [
    counts.toReview > 0 ? `${counts.toReview} to look at` : '',
    counts.reading > 0 ? `${counts.reading} being read` : '',
    counts.undecided > 0 ? `${counts.undecided} undecided` : '',
    counts.leaving > 0 ? `${counts.leaving} leaving` : '',
  ].filter(Boolean);
  return parts.length > 0 ? parts.join(' · ') : 'Nothing waits';
}

/** The households one may see, each on a line with what waits in it. */
export function HouseholdList({ households }: { households: readonly Household[] }) {
  return (
    <ul className="divide-y divide-line overflow-hidden rounded-lg border border-line bg-paper-raised">
      {households.map((household) => (
        <li key={household.id}>
          <Link
            to={paths.household(household.id)}
            className="flex items-center gap-4 px-4 py-4 no-underline hover:bg-teal-wash/50 focus-visible:-outline-offset-2 sm:px-6"
          >
            <span className="grid min-w-0 flex-1 gap-x-6 gap-y-0.5 sm:grid-cols-[minmax(0,2fr)_minmax(0,2fr)_auto] sm:items-baseline">
              <span className="text-lg font-semibold">{household.name}</span>
              <span className="text-ink-soft">{describeWaiting(household)}</span>
              <span className="text-sm text-ink-soft sm:text-right">
                {formatCountry(household.country)} · {formatCount(household.counts.kept, 'paper')}{' '}
                kept
              </span>
            </span>
            <ChevronRight aria-hidden className="size-5 shrink-0 text-ink-faint" />
          </Link>
        </li>
      ))}
    </ul>
  );
}
