import type { z } from 'zod';
import { ChevronRight } from 'lucide-react';
import { Link } from 'react-router-dom';
import type { shredListSummarySchema } from '../../../../server/contract/shred-lists.ts';
import { Section } from '../../../components/ui/section.tsx';
import { formatDay } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { describeAmount } from '../logic/words.ts';
import { StatusBadge } from './status-badge.tsx';

type Summary = z.infer<typeof shredListSummarySchema>;

/** The lists of a household: those under way first, then those that are over. */
export function ListsOverview({ lists }: { lists: readonly Summary[] }) {
  const isOver = (list: Summary) => list.status === 'done' || list.status === 'void';
  const live = lists.filter((list) => !isOver(list));
  const over = lists.filter(isOver);
  return (
    <>
      {live.length > 0 ? (
        <Section title="Under way">
          <SummaryRows lists={live} />
        </Section>
      ) : null}
      {over.length > 0 ? (
        <Section title="Finished">
          <SummaryRows lists={over} />
        </Section>
      ) : null}
    </>
  );
}

function SummaryRows({ lists }: { lists: readonly Summary[] }) {
  return (
    <ul className="overflow-hidden rounded-lg border border-line bg-paper-raised">
      {lists.map((list) => (
        <li key={list.id} className="border-b border-line last:border-b-0">
          <Link
            to={paths.shredList(list.id)}
            className="flex min-h-16 items-center gap-4 px-4 py-3 no-underline -outline-offset-4 hover:bg-paper-sunk"
          >
            <span className="flex min-w-0 flex-1 flex-wrap items-center gap-x-4 gap-y-1">
              <span className="font-semibold">Shred list {list.number}</span>
              <StatusBadge status={list.status} />
              <span className="basis-full text-ink-soft">
                {list.papers > 0
                  ? describeAmount(list.papers, list.sheets, list.weightGrams)
                  : 'Nothing on it'}
                <span className="text-ink-faint"> · for {formatDay(list.on)}</span>
              </span>
            </span>
            <ChevronRight aria-hidden className="size-5 shrink-0 text-ink-faint" />
          </Link>
        </li>
      ))}
    </ul>
  );
}
