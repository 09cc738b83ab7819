import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, Outlet, redirect, ScrollRestoration } from 'react-router-dom';
import type { LoaderFunctionArgs, RouteObject } from 'react-router-dom';
import { paths } from '../lib/paths.ts';
import { sessionQuery } from '../lib/session.ts';
import { Opening } from './opening.tsx';
import { RouteError } from './route-error.tsx';
import type { ScreenHandle } from './screen-handle.ts';

const inHousehold: ScreenHandle = { household: true };
/** Screens with their own bar of actions by the thumb: the household's bar stays away. */
const withOwnBar: ScreenHandle = { household: true, ownBottomBar: true };

function RootLayout() {
  return (
    <>
      <ScrollRestoration />
      <Outlet />
    </>
  );
}

/** The table of screens. Each is a file of its own, fetched when it is first opened. */
export function createRoutes(queryClient: QueryClient): RouteObject[] {
  const requireSignedIn = async ({ request }: LoaderFunctionArgs): Promise<Response | null> => {
    const session = await queryClient.ensureQueryData(sessionQuery);
    if (session.user) return null;
    const { pathname, search } = new URL(request.url);
    return redirect(paths.signIn(pathname === '/' ? undefined : pathname + search));
  };
  const leaveWhenSignedIn = async (): Promise<Response | null> => {
    const session = await queryClient.ensureQueryData(sessionQuery);
    return session.user ? redirect(paths.households()) : null;
  };
  const households: RouteObject[] = [
    { index: true, lazy: () => import('./pages/households-page.tsx') },
    { path: 'households/new', lazy: () => import('./pages/new-household-page.tsx') },
    {
      path: 'households/:householdId',
      handle: inHousehold,
      lazy: () => import('./pages/household-page.tsx'),
    },
    {
      path: 'households/:householdId/about',
      handle: inHousehold,
      lazy: () => import('./pages/about-page.tsx'),
    },
    {
      path: 'households/:householdId/boxes',
      handle: inHousehold,
      lazy: () => import('./pages/boxes-page.tsx'),
    },
    { path: 'boxes/:boxId', handle: inHousehold, lazy: () => import('./pages/box-page.tsx') },
    {
      path: 'households/:householdId/papers',
      handle: inHousehold,
      lazy: () => import('./pages/papers-page.tsx'),
    },
    {
      path: 'households/:householdId/review',
      handle: withOwnBar,
      lazy: () => import('./pages/review-page.tsx'),
    },
    {
      path: 'households/:householdId/review/:paperId',
      handle: withOwnBar,
      lazy: () => import('./pages/review-page.tsx'),
    },
    {
      path: 'households/:householdId/shred-lists',
      handle: inHousehold,
      lazy: () => import('./pages/shred-lists-page.tsx'),
    },
    {
      path: 'shred-lists/:listId',
      handle: inHousehold,
      lazy: () => import('./pages/shred-list-page.tsx'),
    },
    {
      path: 'households/:householdId/holds',
      handle: inHousehold,
      lazy: () => import('./pages/holds-page.tsx'),
    },
    {
      path: 'households/:householdId/subjects',
      handle: inHousehold,
      lazy: () => import('./pages/subjects-page.tsx'),
    },
    {
      path: 'households/:householdId/reminders',
      handle: inHousehold,
      lazy: () => import('./pages/reminders-page.tsx'),
    },
    {
      path: 'households/:householdId/activity',
      handle: inHousehold,
      lazy: () => import('./pages/activity-page.tsx'),
    },
    { path: 'rules', lazy: () => import('./pages/rule-tables-page.tsx') },
    { path: 'rules/:country', lazy: () => import('./pages/rule-table-page.tsx') },
    { path: 'mail', lazy: () => import('./pages/mail-page.tsx') },
    { path: 'reading-quality', lazy: () => import('./pages/reading-quality-page.tsx') },
    { path: '*', lazy: () => import('./pages/not-found-page.tsx') },
  ];
  return [
    {
      element: <RootLayout />,
      errorElement: <RouteError />,
      hydrateFallbackElement: <Opening />,
      children: [
        {
          path: 'sign-in',
          loader: leaveWhenSignedIn,
          lazy: () => import('./pages/sign-in-page.tsx'),
        },
        {
          loader: requireSignedIn,
          // Who is signed in is asked once at the door, not again with every step inside.
          shouldRevalidate: () => false,
          lazy: () => import('./layout/app-layout.tsx'),
          children: [{ errorElement: <RouteError inLayout />, children: households }],
        },
      ],
    },
  ];
}

/** The router of the running application. */
export function createAppRouter(queryClient: QueryClient) {
  return createBrowserRouter(createRoutes(queryClient));
}
