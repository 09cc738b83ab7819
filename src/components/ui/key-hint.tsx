import { joinClasses } from '../../lib/join-classes.ts';

/** The key that does it, shown beside its words; hidden where there is no keyboard. */
export function KeyHint({ keys, className }: { keys: string; className?: string }) {
  return (
    <kbd
      aria-hidden
      className={joinClasses(
        'inline-flex min-w-6 items-center justify-center rounded border border-current/40 px-1.5 font-sans text-xs leading-5 font-semibold pointer-coarse:hidden',
        className,
      )}
    >
      {keys}
    </kbd>
  );
}
