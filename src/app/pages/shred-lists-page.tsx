import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Wind } from 'lucide-react';
import { useNavigate } from 'react-router-dom';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Button } from '../../components/ui/button.tsx';
import { GuidanceNote } from '../../components/ui/guidance-note.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { householdQuery } from '../../features/shred-lists/api/get-household.ts';
import { shredListsQuery } from '../../features/shred-lists/api/list-shred-lists.ts';
import { GatherDialog } from '../../features/shred-lists/components/gather-dialog.tsx';
import { ListsOverview } from '../../features/shred-lists/components/lists-overview.tsx';
import { paths } from '../../lib/paths.ts';
import { useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** Letting go: the shred lists of a household. */
export function Component() {
  const householdId = useRouteId('householdId');
  const navigate = useNavigate();
  const lists = useQuery(shredListsQuery(householdId));
  const today = useQuery(householdQuery(householdId)).data?.today;
  const mayPrepare = useMay('shred-list:prepare', householdId);
  const [isGathering, setIsGathering] = useState(false);
  const gather =
    mayPrepare && today ? (
      <Button tone="primary" onClick={() => setIsGathering(true)}>
        Gather a list
      </Button>
    ) : null;
  return (
    <PageFrame>
      <PageHeading
        title="Let go"
        actions={lists.data && lists.data.items.length > 0 ? gather : null}
      >
        Papers are shredded by list. Nothing goes before somebody of the household has agreed to the
        list, and a record says afterwards where it went.
      </PageHeading>
      <QueryView query={lists} what="the shred lists">
        {({ items }) =>
          items.length > 0 ? (
            <ListsOverview lists={items} />
          ) : (
            <EmptyState icon={<Wind />} title="No list yet" action={gather}>
              {mayPrepare
                ? 'Gather the papers that were put on the shred pile and whose time is up.'
                : 'Once papers may go, your organiser sends you a list to look through.'}
            </EmptyState>
          )
        }
      </QueryView>
      <GuidanceNote className="mt-10 text-sm text-ink-soft" />
      {isGathering && today ? (
        <GatherDialog
          householdId={householdId}
          today={today}
          onGathered={(list) => void navigate(paths.shredList(list.id))}
          onClose={() => setIsGathering(false)}
        />
      ) : null}
    </PageFrame>
  );
}
