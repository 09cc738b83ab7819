import { useState } from 'react';
import { House, Plus } from 'lucide-react';
import { Navigate } from 'react-router-dom';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { LinkButton } from '../../components/ui/button.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { Pager } from '../../components/ui/table.tsx';
import { useHouseholds } from '../../features/households/api/list-households.ts';
import { HouseholdList } from '../../features/households/components/household-list.tsx';
import { paths } from '../../lib/paths.ts';
import { useMay } from '../../lib/use-may.ts';

/** The first screen: which household? Whoever has only one is led straight there. */
export function Component() {
  const [page, setPage] = useState(1);
  const households = useHouseholds(page);
  const mayCreate = useMay('household:create');
  const only = households.data?.total === 1 ? households.data.items[0] : undefined;
  if (only && !mayCreate) return <Navigate replace to={paths.household(only.id)} />;
  const addButton = (
    <LinkButton to={paths.newHousehold()} tone="primary" icon={<Plus aria-hidden />}>
      Add a household
    </LinkButton>
  );
  return (
    <PageFrame>
      <PageHeading title="Households" actions={mayCreate ? addButton : null} />
      <QueryView query={households} what="the households">
        {({ items, total }) =>
          items.length === 0 ? (
            <EmptyState
              icon={<House />}
              title="No household yet"
              action={mayCreate ? addButton : null}
            >
              {mayCreate
                ? 'Add the first one: its name, where it is, and what the people hope for.'
                : 'Nobody has invited you to a household yet. Ask the practice for an invitation.'}
            </EmptyState>
          ) : (
            <>
              <HouseholdList households={items} />
              <Pager page={page} pageSize={50} total={total} onPage={setPage} />
            </>
          )
        }
      </QueryView>
    </PageFrame>
  );
}
