import type { ReactNode } from 'react';
import { CloudOff, RotateCw, TriangleAlert } from 'lucide-react';
import { ApiError, NetworkError, sentenceOf } from '../../lib/api-error.ts';
import { joinClasses } from '../../lib/join-classes.ts';
import { Button } from './button.tsx';

interface EmptyStateProps {
  icon?: ReactNode;
  title: string;
  /** The way forward. */
  action?: ReactNode;
  children?: ReactNode;
}

/** Nothing here, why, and what to do about it. */
export function EmptyState({ icon, title, action, children }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-center gap-3 rounded-lg border border-dashed border-line-strong px-6 py-10 text-center">
      {icon ? (
        <span aria-hidden className="text-ink-faint [&>svg]:size-9">
          {icon}
        </span>
      ) : null}
      <p className="text-lg font-semibold">{title}</p>
      {children ? <div className="max-w-prose text-ink-soft">{children}</div> : null}
      {action ? <div className="mt-1 flex flex-wrap justify-center gap-3">{action}</div> : null}
    </div>
  );
}

interface ErrorStateProps {
  error: unknown;
  onRetry?: () => void;
  /** What could not be shown, for example "the papers". */
  what?: string;
}

/** A load that failed: what, why, and a way to try again. */
export function ErrorState({ error, onRetry, what = 'this' }: ErrorStateProps) {
  const lost = error instanceof NetworkError;
  const missing = error instanceof ApiError && (error.status === 404 || error.status === 403);
  const Icon = lost ? CloudOff : TriangleAlert;
  return (
    <div
      role="alert"
      className="flex flex-col items-center gap-3 rounded-lg border border-line px-6 py-10 text-center"
    >
      <Icon aria-hidden className="size-9 text-ink-faint" />
      <p className="text-lg font-semibold">
        {lost ? 'No connection' : missing ? `We cannot show ${what}` : `Could not load ${what}`}
      </p>
      <p className="max-w-prose text-ink-soft">
        {lost
          ? 'Nothing you saved is lost. Check the connection, then try again.'
          : sentenceOf(error)}
      </p>
      {onRetry && !missing ? (
        <Button icon={<RotateCw aria-hidden />} onClick={onRetry}>
          Try again
        </Button>
      ) : null}
    </div>
  );
}

/** The shape of what is coming. Give it the size of what it stands for, so that nothing jumps. */
export function Skeleton({ className }: { className?: string }) {
  return (
    <div aria-hidden className={joinClasses('animate-pulse rounded-md bg-paper-sunk', className)} />
  );
}

/** Several lines to come, announced once to those who listen. */
export function SkeletonLines({
  lines = 4,
  label = 'Loading',
}: {
  lines?: number;
  label?: string;
}) {
  return (
    <div role="status" className="flex flex-col gap-3">
      <span className="sr-only">{label}</span>
      {Array.from({ length: lines }, (_, i) => (
        <Skeleton key={i} className="h-14" />
      ))}
    </div>
  );
}
