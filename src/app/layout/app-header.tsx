import { useQuery } from '@tanstack/react-query';
import { BookOpen, ChevronDown, House, LogOut, ScanText, Mail, UserRound } from 'lucide-react';
import { toast } from 'sonner';
import { Link, useNavigate } from 'react-router-dom';
import { Wordmark } from '../../components/layout/wordmark.tsx';
import { Menu, MenuItem, MenuLabel, MenuLine } from '../../components/ui/menu.tsx';
import { householdQuery } from '../../features/households/api/get-household.ts';
import { useSignOut } from '../../features/session/api/sign-out.ts';
import { sentenceOf } from '../../lib/api-error.ts';
import { paths } from '../../lib/paths.ts';
import { useSession } from '../../lib/session.ts';
import { useMay } from '../../lib/use-may.ts';

function AccountMenu() {
  const navigate = useNavigate();
  const signOut = useSignOut();
  const session = useSession();
  const mayReadMail = useMay('mail:read');
  const maySeeQuality = useMay('practice:read');
  const leave = (): void => {
    signOut.mutate(undefined, {
      onSuccess: () => void navigate(paths.signIn(), { replace: true }),
      onError: (error) => toast.error(sentenceOf(error)),
    });
  };
  const name = session?.user?.name ?? '';
  return (
    <Menu
      trigger={
        <button
          type="button"
          className="inline-flex min-h-11 min-w-11 items-center justify-center gap-2 rounded-md px-2 font-semibold hover:bg-white/10"
        >
          <UserRound aria-hidden className="size-5" />
          <span className="sr-only sm:not-sr-only">{name || 'Account'}</span>
          <ChevronDown aria-hidden className="hidden size-4 sm:block" />
        </button>
      }
    >
      <MenuLabel>{session?.user?.email}</MenuLabel>
      <MenuItem asChild>
        <Link to={paths.households()}>
          <House aria-hidden />
          Households
        </Link>
      </MenuItem>
      <MenuItem asChild>
        <Link to={paths.rules()}>
          <BookOpen aria-hidden />
          How long papers are kept
        </Link>
      </MenuItem>
      {mayReadMail ? (
        <MenuItem asChild>
          <Link to={paths.mail()}>
            <Mail aria-hidden />
            Messages sent
          </Link>
        </MenuItem>
      ) : null}
      {maySeeQuality ? (
        <MenuItem asChild>
          <Link to={paths.readingQuality()}>
            <ScanText aria-hidden />
            How well papers are read
          </Link>
        </MenuItem>
      ) : null}
      <MenuLine />
      <MenuItem onSelect={leave}>
        <LogOut aria-hidden />
        Sign out
      </MenuItem>
    </Menu>
  );
}

/** The dark line at the top: the product, the household in view, the person. */
export function AppHeader({ householdId }: { householdId: string | null }) {
  const { data: household } = useQuery({
    ...householdQuery(householdId ?? ''),
    enabled: householdId !== null,
  });
  return (
    <header data-screen-only className="on-dark bg-ink text-white">
      <div className="flex h-14 items-center gap-2 px-3 sm:px-6 lg:px-8">
        <Link
          to={paths.households()}
          className="inline-flex min-h-11 min-w-11 items-center rounded-md px-1 no-underline hover:bg-white/10"
        >
          <Wordmark compact={householdId !== null} />
        </Link>
        {householdId ? (
          <>
            <span aria-hidden className="text-white/40">
              /
            </span>
            <Link
              to={paths.household(householdId)}
              className="min-w-0 truncate rounded-md px-2 py-2.5 font-semibold no-underline hover:bg-white/10"
            >
              {household?.name ?? 'Household'}
            </Link>
          </>
        ) : null}
        <div className="ml-auto">
          <AccountMenu />
        </div>
      </div>
    </header>
  );
}
