import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { Skeleton } from '../../components/ui/states.tsx';
import { householdQuery } from '../../features/shred-lists/api/get-household.ts';
import { shredListQuery } from '../../features/shred-lists/api/get-shred-list.ts';
import { ShredListView } from '../../features/shred-lists/components/shred-list-view.tsx';
import { StatusBadge } from '../../features/shred-lists/components/status-badge.tsx';
import { describeAmount } from '../../features/shred-lists/logic/words.ts';
import { paths } from '../../lib/paths.ts';
import { useSession } from '../../lib/session.ts';
import { useMay } from '../../lib/use-may.ts';
import { useHouseholdInView } from '../layout/household-in-view.ts';
import { useRouteId } from '../use-route-id.ts';

/** One shred list: looked over, agreed to, carried out, on record. */
export function Component() {
  const listId = useRouteId('listId');
  const list = useQuery(shredListQuery(listId));
  const householdId = list.data?.householdId;
  useHouseholdInView(householdId);
  const household = useQuery({
    ...householdQuery(householdId ?? ''),
    enabled: householdId !== undefined,
  });
  const memberships = useSession()?.memberships ?? [];
  const isOwnConsent = memberships.some(
    (m) => m.householdId === householdId && m.role === 'client',
  );
  const mayPrepare = useMay('shred-list:prepare', householdId);
  const mayReview = useMay('paper:review', householdId);
  const loading = <Skeleton className="h-96" />;
  return (
    <PageFrame>
      <PageHeading
        title={list.data ? `Shred list ${list.data.number}` : 'Shred list'}
        above={
          list.data ? (
            <Link to={paths.shredLists(list.data.householdId)} className="underline hover:text-ink">
              Let go · {list.data.householdName}
            </Link>
          ) : (
            ' '
          )
        }
      >
        {list.data ? (
          <span className="flex flex-wrap items-center gap-x-3 gap-y-1">
            <StatusBadge status={list.data.status} />
            {list.data.rows.length > 0
              ? describeAmount(
                  list.data.rows.filter((row) => !row.keptBack && row.outcome !== 'kept-back')
                    .length,
                  list.data.sheets,
                  list.data.weightGrams,
                )
              : 'Nothing on it'}
          </span>
        ) : (
          ' '
        )}
      </PageHeading>
      <QueryView query={list} what="this shred list" loading={loading}>
        {(data) => (
          <QueryView query={household} what="the household" loading={loading}>
            {({ today }) => (
              <ShredListView
                key={data.id}
                list={data}
                today={today}
                isOwnConsent={isOwnConsent}
                mayPrepare={mayPrepare}
                mayReview={mayReview}
              />
            )}
          </QueryView>
        )}
      </QueryView>
    </PageFrame>
  );
}
