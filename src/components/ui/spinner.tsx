import { LoaderCircle } from 'lucide-react';

/** Work in progress; with a label it is announced, without one it is decoration. */
export function Spinner({ label }: { label?: string }) {
  return (
    <span role={label ? 'status' : undefined} className="inline-flex items-center gap-2">
      <LoaderCircle aria-hidden className="size-[1.15em] animate-spin" />
      {label ? <span>{label}</span> : null}
    </span>
  );
}
