import { useEffect, useRef } from 'react';
import type { ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import { joinClasses } from '../../lib/join-classes.ts';
import { usePageTitle } from '../../lib/use-page-title.ts';

let lastFocusedKey: string | null = null;

interface PageHeadingProps {
  /** The heading, also the name of the browser's tab unless `tabTitle` is given. */
  title: string;
  tabTitle?: string;
  /** One line above it: where we are. */
  above?: ReactNode;
  /** One or two sentences under it. */
  children?: ReactNode;
  /** Buttons at its end. */
  actions?: ReactNode;
  /** What counts as another screen; the address when absent. */
  focusKey?: string;
  /** For screens that have no room for it: the heading is for those who listen. */
  hidden?: boolean;
}

/** The screen's one h1. It takes focus after navigation, so that those who listen know where they are. */
export function PageHeading({
  title,
  tabTitle,
  above,
  children,
  actions,
  focusKey,
  hidden = false,
}: PageHeadingProps) {
  const { pathname } = useLocation();
  const heading = useRef<HTMLHeadingElement>(null);
  const key = focusKey ?? pathname;
  usePageTitle(tabTitle ?? title);
  useEffect(() => {
    // Not at the first screen: there the browser itself announces the page.
    if (lastFocusedKey !== null && lastFocusedKey !== key) {
      heading.current?.focus({ preventScroll: true });
    }
    lastFocusedKey = key;
  }, [key]);
  return (
    <div
      className={joinClasses(
        hidden ? 'sr-only' : 'mb-6 flex flex-wrap items-end justify-between gap-x-6 gap-y-4',
      )}
    >
      <div className="min-w-0 max-w-3xl">
        {above ? <p className="text-sm text-ink-soft">{above}</p> : null}
        <h1
          ref={heading}
          tabIndex={-1}
          className="text-2xl leading-tight font-semibold sm:text-3xl"
        >
          {title}
        </h1>
        {children ? <div className="mt-2 text-ink-soft">{children}</div> : null}
      </div>
      {actions ? <div className="flex flex-wrap gap-3">{actions}</div> : null}
    </div>
  );
}
