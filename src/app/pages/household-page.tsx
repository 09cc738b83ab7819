import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { GuidanceNote } from '../../components/ui/guidance-note.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { Skeleton } from '../../components/ui/states.tsx';
import { useFilings } from '../../features/filings/api/list-filings.ts';
import { useHousehold } from '../../features/households/api/get-household.ts';
import { useOutflow } from '../../features/households/api/get-outflow.ts';
import { useListsToApprove } from '../../features/households/api/list-lists-to-approve.ts';
import { OutflowPicture } from '../../features/households/components/outflow-picture.tsx';
import { WayForward } from '../../features/households/components/way-forward.tsx';
import { listWaiting } from '../../features/households/logic/list-waiting.ts';
import { useSession } from '../../lib/session.ts';
import { decideMay, useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** Where a household stands: what waits, and the outflow. */
export function Component() {
  const householdId = useRouteId('householdId');
  const session = useSession();
  const household = useHousehold(householdId);
  const outflow = useOutflow(householdId);
  const filings = useFilings(householdId, useMay('subject:write', householdId));
  const lists = useListsToApprove(householdId, useMay('shred-list:approve', householdId));
  return (
    <PageFrame>
      <PageHeading
        title={household.data?.name ?? 'Household'}
        {...(household.data ? { above: household.data.practiceName } : {})}
      />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 gap-y-10 lg:grid-cols-[minmax(0,2fr)_minmax(0,3fr)]">
        <section aria-labelledby="way-forward">
          <h2 id="way-forward" className="mb-4 text-sm font-semibold text-ink-soft">
            The way forward
          </h2>
          <QueryView
            query={household}
            what="this household"
            loading={<Skeleton className="h-64" />}
          >
            {(data) => (
              <WayForward
                steps={listWaiting({
                  household: data,
                  outflow: outflow.data,
                  listsToApprove: lists.data ?? [],
                  filingQuestion: filings.data?.questions[0],
                  may: (permission) =>
                    decideMay(session?.memberships ?? [], permission, householdId),
                })}
              />
            )}
          </QueryView>
        </section>
        <section aria-labelledby="outflow">
          <h2 id="outflow" className="mb-4 text-sm font-semibold text-ink-soft">
            The outflow: how much paper is still to leave
          </h2>
          <QueryView
            query={outflow}
            what="the outflow"
            loading={<Skeleton className="h-[26rem]" />}
          >
            {(data) => <OutflowPicture outflow={data} />}
          </QueryView>
        </section>
      </div>
      <GuidanceNote className="mt-10 text-sm text-ink-soft" />
    </PageFrame>
  );
}
