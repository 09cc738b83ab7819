import { isRouteErrorResponse, useRevalidator, useRouteError } from 'react-router-dom';
import { PageFrame } from '../components/layout/page-frame.tsx';
import { PageHeading } from '../components/layout/page-heading.tsx';
import { Wordmark } from '../components/layout/wordmark.tsx';
import { LinkButton } from '../components/ui/button.tsx';
import { ErrorState } from '../components/ui/states.tsx';
import { NetworkError } from '../lib/api-error.ts';
import { paths } from '../lib/paths.ts';

/** Whether a screen's file could not be fetched: the connection is gone, or the program was renewed. */
function isMissingFile(error: unknown): boolean {
  return error instanceof TypeError && /module|import|fetch/i.test(error.message);
}

/** The screen for what no other screen caught. */
export function RouteError({ inLayout = false }: { inLayout?: boolean }) {
  const error = useRouteError();
  const { revalidate } = useRevalidator();
  const lost = error instanceof NetworkError;
  const notFound = isRouteErrorResponse(error) && error.status === 404;
  const retry = (): void => {
    if (lost) void revalidate();
    else window.location.reload();
  };
  return (
    <PageFrame width="reading">
      {inLayout ? null : (
        <div className="mb-8">
          <Wordmark />
        </div>
      )}
      <PageHeading
        title={
          notFound
            ? 'There is nothing at this address'
            : lost
              ? 'No connection'
              : 'Something went wrong'
        }
      />
      <ErrorState
        error={isMissingFile(error) ? new NetworkError() : error}
        what="this screen"
        onRetry={retry}
      />
      <p className="mt-6 text-center">
        <LinkButton to={paths.households()}>Go to the households</LinkButton>
      </p>
    </PageFrame>
  );
}
