import { useNavigate } from 'react-router-dom';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { NewHouseholdForm } from '../../features/households/components/new-household-form.tsx';
import { paths } from '../../lib/paths.ts';

export function Component() {
  const navigate = useNavigate();
  return (
    <PageFrame width="reading">
      <PageHeading title="Add a household">
        Circumstances and the first box come next, once it is here.
      </PageHeading>
      <NewHouseholdForm onCreated={(household) => void navigate(paths.about(household.id))} />
    </PageFrame>
  );
}
