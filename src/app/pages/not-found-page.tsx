import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { LinkButton } from '../../components/ui/button.tsx';
import { paths } from '../../lib/paths.ts';

export function Component() {
  return (
    <PageFrame width="reading">
      <PageHeading title="There is nothing at this address">
        The address may be mistyped, or what it led to is not shared with you.
      </PageHeading>
      <LinkButton tone="primary" to={paths.households()}>
        Go to the households
      </LinkButton>
    </PageFrame>
  );
}
