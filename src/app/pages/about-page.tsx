import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { FilingsSection } from '../../features/filings/components/filings-section.tsx';
import { useHousehold } from '../../features/households/api/get-household.ts';
import { AboutFacts } from '../../features/households/components/about-facts.tsx';
import { AboutForm } from '../../features/households/components/about-form.tsx';
import { useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** What is known about a household, and what the rules make of it. */
export function Component() {
  const householdId = useRouteId('householdId');
  const household = useHousehold(householdId);
  const mayChange = useMay('household:update', householdId);
  const mayAnswer = useMay('subject:write', householdId);
  return (
    <PageFrame>
      <PageHeading title="About the household" />
      <QueryView query={household} what="this household">
        {(data) =>
          mayChange ? <AboutForm key={data.id} household={data} /> : <AboutFacts household={data} />
        }
      </QueryView>
      <FilingsSection householdId={householdId} mayAnswer={mayAnswer} />
    </PageFrame>
  );
}
