import { useId } from 'react';
import type { ReactNode } from 'react';
import { CircleAlert } from 'lucide-react';
import { joinClasses } from '../../lib/join-classes.ts';

/** What `Field` hands to the control inside it. */
export interface ControlProps {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
}

interface FieldProps {
  label: ReactNode;
  hint?: ReactNode;
  /** The fault found, a sentence that says what to do. */
  error?: string | undefined;
  /** Says "if you know it" instead of marking everything else as required. */
  optional?: boolean;
  /** The label is for those who listen; the place says it to those who see. */
  hideLabel?: boolean;
  className?: string;
  children: (control: ControlProps) => ReactNode;
}

/** A control with its label, hint and error, tied together for those who listen. */
export function Field({
  label,
  hint,
  error,
  optional = false,
  hideLabel = false,
  className,
  children,
}: FieldProps) {
  const id = useId();
  const hintId = `${id}-hint`;
  const errorId = `${id}-error`;
  const describedBy = [hint ? hintId : '', error ? errorId : ''].filter(Boolean).join(' ');
  return (
    <div className={joinClasses('flex min-w-0 flex-col gap-1', className)}>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : 'font-semibold'}>
        {label}
        {optional ? <span className="font-normal text-ink-faint"> (if you know it)</span> : null}
      </label>
      {hint ? (
        <p id={hintId} className="text-sm text-ink-soft">
          {hint}
        </p>
      ) : null}
      {children({
        id,
        'aria-describedby': describedBy || undefined,
        'aria-invalid': error ? true : undefined,
      })}
      {error ? (
        <p
          id={errorId}
          className="flex items-start gap-1.5 text-sm font-semibold text-amber-strong"
        >
          <CircleAlert aria-hidden className="mt-0.5 size-4 shrink-0" />
          {error}
        </p>
      ) : null}
    </div>
  );
}
