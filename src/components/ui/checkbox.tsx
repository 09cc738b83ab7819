import type { ComponentProps, ReactNode } from 'react';
import { joinClasses } from '../../lib/join-classes.ts';

interface CheckboxProps extends Omit<ComponentProps<'input'>, 'type'> {
  label: ReactNode;
}

/** A box to tick with its words beside it; the whole line can be pressed. */
export function Checkbox({ label, className, ...rest }: CheckboxProps) {
  return (
    <label className={joinClasses('flex min-h-11 items-center gap-3', className)}>
      <input {...rest} type="checkbox" className="size-5 shrink-0 accent-teal" />
      <span className="min-w-0">{label}</span>
    </label>
  );
}

/** One of several choices shown at once. */
export function Radio({ label, className, ...rest }: CheckboxProps) {
  return (
    <label className={joinClasses('flex min-h-11 items-center gap-3', className)}>
      <input {...rest} type="radio" className="size-5 shrink-0 accent-teal" />
      <span className="min-w-0">{label}</span>
    </label>
  );
}
