import { useState } from 'react';
import { Hand } from 'lucide-react';
import type { Hold } from '../../../server/contract/holds.ts';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Button } from '../../components/ui/button.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { Section } from '../../components/ui/section.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { useHolds } from '../../features/holds/api/list-holds.ts';
import { HoldList } from '../../features/holds/components/hold-list.tsx';
import { LiftHoldDialog } from '../../features/holds/components/lift-hold-dialog.tsx';
import { PlaceHoldDialog } from '../../features/holds/components/place-hold-dialog.tsx';
import { useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** What must not be destroyed yet, and why. */
export function Component() {
  const householdId = useRouteId('householdId');
  const holds = useHolds(householdId);
  const mayPlace = useMay('hold:place', householdId);
  const [isPlacing, setIsPlacing] = useState(false);
  const [lifting, setLifting] = useState<Hold | null>(null);
  return (
    <PageFrame>
      <PageHeading
        title="Don’t destroy yet"
        actions={
          mayPlace ? (
            <Button icon={<Hand aria-hidden />} onClick={() => setIsPlacing(true)}>
              Hold everything
            </Button>
          ) : null
        }
      >
        What is covered stays, whatever its date: an enquiry, a dispute, an estate, somebody’s wish.
      </PageHeading>
      <QueryView query={holds} what="the holds">
        {({ items }) => {
          const live = items.filter((hold) => !hold.liftedOn);
          const lifted = items.filter((hold) => hold.liftedOn);
          return (
            <>
              {live.length > 0 ? (
                <HoldList holds={live} onLift={setLifting} />
              ) : (
                <EmptyState icon={<Hand />} title="Nothing is on hold">
                  Papers follow their own dates. A single paper is held on its own page.
                </EmptyState>
              )}
              {lifted.length > 0 ? (
                <Section title="Lifted">
                  <HoldList holds={lifted} />
                </Section>
              ) : null}
            </>
          );
        }}
      </QueryView>
      {isPlacing ? (
        <PlaceHoldDialog householdId={householdId} onClose={() => setIsPlacing(false)} />
      ) : null}
      {lifting ? <LiftHoldDialog hold={lifting} onClose={() => setLifting(null)} /> : null}
    </PageFrame>
  );
}
