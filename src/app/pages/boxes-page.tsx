import { useState } from 'react';
import { PackageOpen, Plus } from 'lucide-react';
import { useNavigate } from 'react-router-dom';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Button } from '../../components/ui/button.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { useBoxes } from '../../features/boxes/api/list-boxes.ts';
import { BoxList } from '../../features/boxes/components/box-list.tsx';
import { NewBoxDialog } from '../../features/boxes/components/new-box-dialog.tsx';
import { paths } from '../../lib/paths.ts';
import { useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** The boxes of a household: where papers come in. */
export function Component() {
  const householdId = useRouteId('householdId');
  const boxes = useBoxes(householdId);
  const mayAdd = useMay('box:write', householdId);
  const [isAdding, setIsAdding] = useState(false);
  const navigate = useNavigate();
  const add = mayAdd ? (
    <Button tone="primary" icon={<Plus aria-hidden />} onClick={() => setIsAdding(true)}>
      Add a box
    </Button>
  ) : null;
  return (
    <PageFrame>
      <PageHeading title="Boxes" actions={boxes.data?.items.length ? add : null}>
        Open a box to scan its papers into it, or to print its label.
      </PageHeading>
      <QueryView query={boxes} what="the boxes">
        {({ items }) =>
          items.length > 0 ? (
            <BoxList boxes={items} />
          ) : (
            <EmptyState icon={<PackageOpen />} title="No box yet" action={add}>
              A box is whatever holds a pile. Each gets a code, so that every sheet can be found
              again.
            </EmptyState>
          )
        }
      </QueryView>
      {isAdding ? (
        <NewBoxDialog
          householdId={householdId}
          onClose={() => setIsAdding(false)}
          onCreated={(box) => void navigate(paths.box(box.id))}
        />
      ) : null}
    </PageFrame>
  );
}
