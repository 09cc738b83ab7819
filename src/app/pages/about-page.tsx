import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { FilingSection } from '../../features/filings/components/filing-section.tsx';
import { useHousehold } from '../../features/households/api/get-household.ts';
import { AboutFacts } from '../../features/households/components/about-facts.tsx';
import { AboutForm } from '../../features/households/components/about-form.tsx';
import { MemberList } from '../../features/households/components/member-list.tsx';
import { useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** Who they are and how they live, as far as the rules ask. */
export function Component() {
  const householdId = useRouteId('householdId');
  const household = useHousehold(householdId);
  const mayUpdate = useMay('household:update', householdId);
  const mayAnswer = useMay('subject:write', householdId);
  return (
    <PageFrame width="reading">
      <PageHeading title="About the household">
        How long papers are kept depends on where people live and what they do.
      </PageHeading>
      <QueryView query={household} what="this household">
        {(data) => (
          <>
            <div className="mb-10">
              <FilingSection household={data} mayAnswer={mayAnswer} />
            </div>
            {mayUpdate ? (
              <AboutForm key={data.id} household={data} />
            ) : (
              <AboutFacts household={data} />
            )}
            <div className="mt-10">
              <MemberList householdId={householdId} />
            </div>
          </>
        )}
      </QueryView>
    </PageFrame>
  );
}
