import { useEffect, useMemo, useState } from 'react';
import { Outlet, useLocation, useMatch, useMatches, useNavigate } from 'react-router-dom';
import { Toaster } from 'sonner';
import { Banner } from '../../components/ui/banner.tsx';
import { joinClasses } from '../../lib/join-classes.ts';
import { paths } from '../../lib/paths.ts';
import { useSession } from '../../lib/session.ts';
import { useOnline } from '../../lib/use-online.ts';
import type { ScreenHandle } from '../screen-handle.ts';
import { AppHeader } from './app-header.tsx';
import { HouseholdInViewContext } from './household-in-view.ts';
import { HouseholdBottomBar, HouseholdTaskRow } from './household-tasks.tsx';

/** The household of the screen in view: by the address, or as the screen said (`useHouseholdInView`). */
function useCurrentHousehold(inHousehold: boolean): [string | null, (id: string | null) => void] {
  const match = useMatch('/households/:householdId/*');
  const { pathname } = useLocation();
  const [told, setTold] = useState<{ path: string; id: string | null }>({ path: '', id: null });
  const tell = useMemo(() => (id: string | null) => setTold({ path: pathname, id }), [pathname]);
  const byAddress = match?.params.householdId;
  if (!inHousehold) return [null, tell];
  return [byAddress ?? (told.path === pathname ? told.id : null), tell];
}

/** Leads to the sign-in screen when the sign-in has lapsed, and back afterwards. */
function useLeaveWhenSignedOut(): void {
  const session = useSession();
  const navigate = useNavigate();
  const { pathname, search } = useLocation();
  const isSignedOut = session !== undefined && session.user === null;
  useEffect(() => {
    if (isSignedOut) void navigate(paths.signIn(pathname + search), { replace: true });
  }, [isSignedOut, navigate, pathname, search]);
}

/** The frame of every screen after sign-in: header, a household's tasks, the screen itself. */
export function Component() {
  const online = useOnline();
  const handles = useMatches().map((match) => match.handle as ScreenHandle | undefined);
  const inHousehold = handles.some((handle) => handle?.household);
  const ownBottomBar = handles.some((handle) => handle?.ownBottomBar);
  const [householdId, tellHousehold] = useCurrentHousehold(inHousehold);
  useLeaveWhenSignedOut();
  return (
    <div
      className={joinClasses(
        'flex min-h-dvh flex-col [--app-top:3.5rem]',
        inHousehold && 'md:[--app-top:6.5rem]',
      )}
    >
      <a
        href="#screen"
        className="sr-only z-50 rounded-md bg-paper-raised px-4 py-3 font-semibold text-teal-strong focus:not-sr-only focus:absolute focus:top-1 focus:left-2"
      >
        Skip to the screen
      </a>
      <AppHeader householdId={householdId} />
      {inHousehold ? <HouseholdTaskRow householdId={householdId} /> : null}
      {online ? null : (
        <Banner tone="soon" title="No connection" className="rounded-none">
          You can go on looking at what is here. Changes are sent when the connection is back.
        </Banner>
      )}
      <HouseholdInViewContext value={tellHousehold}>
        <main
          id="screen"
          className={joinClasses(
            'flex min-w-0 flex-1 flex-col',
            inHousehold && !ownBottomBar && 'pb-[calc(4rem+env(safe-area-inset-bottom))] md:pb-0',
          )}
        >
          <Outlet />
        </main>
      </HouseholdInViewContext>
      {inHousehold && !ownBottomBar ? <HouseholdBottomBar householdId={householdId} /> : null}
      <Toaster
        position="bottom-center"
        offset={{ bottom: '1.5rem' }}
        mobileOffset={{ bottom: 'calc(4.75rem + env(safe-area-inset-bottom))' }}
        toastOptions={{
          classNames: {
            toast: '!font-sans !text-base !rounded-lg !border-line !bg-ink !text-white !shadow-lg',
            actionButton: '!min-h-9 !rounded-md !bg-white !px-3 !text-sm !font-semibold !text-ink',
            description: '!text-white/80',
          },
        }}
      />
    </div>
  );
}
