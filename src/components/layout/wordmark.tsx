import { joinClasses } from '../../lib/join-classes.ts';

/** The product's name with its sign: two tides and the still line between them. */
export function Wordmark({
  compact = false,
  className,
}: {
  compact?: boolean;
  className?: string;
}) {
  return (
    <span className={joinClasses('inline-flex items-center gap-2.5 font-semibold', className)}>
      <svg
        aria-hidden
        viewBox="0 0 32 24"
        className="h-6 w-8 shrink-0"
        fill="none"
        stroke="currentColor"
        strokeLinecap="round"
        strokeWidth="2.4"
      >
        <path
          d="M3 5c3.2-3.4 6.5-3.4 9.7 0s6.500 3.400 9.700 0c2.200-2.300 4.400-3 6.600-2"
          opacity=".55"
        />
        <path d="M3 12h26" />
        <path
          d="M3 19c3.200 3.400 6.500 3.400 9.700 0s6.500-3.400 9.700 0c2.200 2.300 4.400 3 6.600 2"
          opacity=".55"
        />
      </svg>
      <span className={compact ? 'sr-only lg:not-sr-only' : 'text-lg tracking-tight'}>
        Slackwater
      </span>
    </span>
  );
}
