/** How much of something is done, `share` from 0 to 1. */
export function ProgressBar({ label, share }: { label: string; share: number }) {
  const percent = Math.round(Math.min(1, Math.max(0, share)) * 100);
  return (
    <span className="flex items-center gap-2">
      <span
        role="progressbar"
        aria-label={label}
        aria-valuenow={percent}
        aria-valuemin={0}
        aria-valuemax={100}
        className="block h-2 w-28 overflow-hidden rounded-full bg-paper-sunk"
      >
        <span className="block h-full bg-teal" style={{ width: `${percent}%` }} />
      </span>
      <span className="w-10 text-sm text-ink-soft tabular-nums">{percent} %</span>
    </span>
  );
}
