import { useState } from 'react';
import { PackageOpen, Plus } from 'lucide-react';
import { useNavigate } from 'react-router-dom';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Button } from '../../components/ui/button.tsx';
import { Dialog } from '../../components/ui/dialog.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { useBoxes } from '../../features/boxes/api/list-boxes.ts';
import { BoxList } from '../../features/boxes/components/box-list.tsx';
import { NewBoxForm } from '../../features/boxes/components/new-box-form.tsx';
import { paths } from '../../lib/paths.ts';
import { useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** Where papers come from. */
export function Component() {
  const householdId = useRouteId('householdId');
  const navigate = useNavigate();
  const boxes = useBoxes(householdId);
  const mayWrite = useMay('box:write', householdId);
  const [isAdding, setAdding] = useState(false);
  const addButton = mayWrite ? (
    <Button tone="primary" icon={<Plus aria-hidden />} onClick={() => setAdding(true)}>
      Open a box
    </Button>
  ) : null;
  return (
    <PageFrame>
      <PageHeading title="Bring in" actions={addButton}>
        A box is where papers come from: a drawer, a shelf, a carton.
      </PageHeading>
      <QueryView query={boxes} what="the boxes">
        {({ items }) =>
          items.length === 0 ? (
            <EmptyState icon={<PackageOpen />} title="No box yet" action={addButton}>
              Open the first one, print its label, then put its papers under the scanner or camera.
            </EmptyState>
          ) : (
            <BoxList boxes={items} />
          )
        }
      </QueryView>
      <Dialog open={isAdding} onOpenChange={setAdding} title="Open a box">
        <NewBoxForm
          householdId={householdId}
          onCreated={(box) => void navigate(paths.box(box.id))}
        />
      </Dialog>
    </PageFrame>
  );
}
