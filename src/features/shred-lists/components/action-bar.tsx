import type { ReactNode } from 'react';

/** What was chosen so far and the way on, always within reach: above the tasks on a phone. */
export function ActionBar({ words, children }: { words: ReactNode; children: ReactNode }) {
  return (
    <div
      role="group"
      aria-label="Your choice so far"
      className="sticky bottom-[calc(4rem+env(safe-area-inset-bottom))] z-20 mt-4 flex flex-wrap items-center justify-between gap-x-6 gap-y-3 rounded-lg border border-line-strong bg-paper-raised px-4 py-3 shadow-lg md:bottom-4"
    >
      <p aria-live="polite" className="min-w-0 flex-1 basis-48">
        {words}
      </p>
      <div className="flex flex-wrap gap-3">{children}</div>
    </div>
  );
}
