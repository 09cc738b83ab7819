import { useNavigate, useSearchParams } from 'react-router-dom';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Wordmark } from '../../components/layout/wordmark.tsx';
import { SignInForm } from '../../features/session/components/sign-in-form.tsx';
import { paths } from '../../lib/paths.ts';

/** A place inside the application; anything else leads to the households. */
function chooseNext(next: string | null): string {
  return next && /^\/(?![/\\])/.test(next) ? next : paths.households();
}

export function Component() {
  const navigate = useNavigate();
  const [search] = useSearchParams();
  return (
    <div className="flex min-h-dvh flex-col bg-ink text-white">
      <main className="flex flex-1 flex-col sm:items-center sm:justify-center sm:px-6">
        <div className="px-6 pt-10 pb-8 sm:w-full sm:max-w-md sm:px-0">
          <Wordmark />
          <p className="mt-4 max-w-sm text-lg text-white/85">
            What must stay has its place and a date. Everything else has left, on purpose and on
            record.
          </p>
        </div>
        <div className="flex-1 rounded-t-2xl bg-paper-raised px-6 pt-7 pb-10 text-ink sm:w-full sm:max-w-md sm:flex-none sm:rounded-2xl sm:px-8">
          <PageHeading title="Sign in" />
          <SignInForm
            onSignedIn={() => void navigate(chooseNext(search.get('next')), { replace: true })}
          />
        </div>
      </main>
    </div>
  );
}
