import { History } from 'lucide-react';
import { Link, useSearchParams } from 'react-router-dom';
import type { Activity } from '../../../server/contract/activity.ts';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { Pager } from '../../components/ui/table.tsx';
import { activityPageSize, useActivity } from '../../features/activity/api/list-activity.ts';
import { formatInstant } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { useRouteId } from '../use-route-id.ts';

/** Who did what when. Nothing here is ever changed. */
export function Component() {
  const householdId = useRouteId('householdId');
  const [search, setSearch] = useSearchParams();
  const page = Math.max(1, Number(search.get('page') ?? '1') || 1);
  const activity = useActivity(householdId, page);
  return (
    <PageFrame>
      <PageHeading title="What happened">
        Who did what when, newest first. Nothing here can be changed afterwards.
      </PageHeading>
      <QueryView query={activity} what="what happened">
        {({ items, total }) =>
          items.length === 0 ? (
            <EmptyState icon={<History />} title="Nothing happened yet" />
          ) : (
            <>
              <ol className="divide-y divide-line border-y border-line">
                {items.map((entry) => (
                  <li key={entry.id} className="flex flex-wrap gap-x-5 gap-y-0.5 py-2.5">
                    <time
                      dateTime={entry.at}
                      className="w-44 shrink-0 text-sm text-ink-soft tabular-nums"
                    >
                      {formatInstant(entry.at)}
                    </time>
                    <span className="w-40 shrink-0 text-sm">{entry.byName}</span>
                    <span className="min-w-0 flex-1 basis-64">
                      <Sentence entry={entry} householdId={householdId} />
                    </span>
                  </li>
                ))}
              </ol>
              <Pager
                page={page}
                pageSize={activityPageSize}
                total={total}
                onPage={(next) => setSearch({ page: String(next) })}
              />
            </>
          )
        }
      </QueryView>
    </PageFrame>
  );
}

function Sentence({ entry, householdId }: { entry: Activity; householdId: string }) {
  const to = entry.paperId
    ? paths.review(householdId, entry.paperId)
    : entry.shredListId
      ? paths.shredList(entry.shredListId)
      : null;
  return to ? (
    <Link to={to} className="underline decoration-line-strong hover:decoration-current">
      {entry.sentence}
    </Link>
  ) : (
    entry.sentence
  );
}
