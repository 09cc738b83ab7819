import type { ComponentProps } from 'react';
import { ChevronDown } from 'lucide-react';
import { joinClasses } from '../../lib/join-classes.ts';
import { controlStyle } from './control-style.ts';

/** One choice of a few; the device's own list, which a thumb knows. */
export function Select({ className, children, ...rest }: ComponentProps<'select'>) {
  return (
    <span className={joinClasses('relative inline-block w-full min-w-0', className)}>
      <select {...rest} className={joinClasses(controlStyle, 'appearance-none truncate pr-9')}>
        {children}
      </select>
      <ChevronDown
        aria-hidden
        className="pointer-events-none absolute top-1/2 right-3 size-4 -translate-y-1/2 text-ink-soft"
      />
    </span>
  );
}
