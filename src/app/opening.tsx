import { Wordmark } from '../components/layout/wordmark.tsx';

/** What is seen while the first screen is being fetched. */
export function Opening() {
  return (
    <div role="status" className="flex min-h-dvh flex-col items-center justify-center gap-3">
      <Wordmark />
      <span className="sr-only">Opening</span>
    </div>
  );
}
