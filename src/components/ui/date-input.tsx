import type { ComponentProps } from 'react';
import { joinClasses } from '../../lib/join-classes.ts';
import { controlStyle } from './control-style.ts';

/** A calendar day; its value is ISO text, `yyyy-mm-dd`, or empty. */
export function DateInput({ className, ...rest }: Omit<ComponentProps<'input'>, 'type'>) {
  return (
    <input
      min="1800-01-01"
      max="2299-12-31"
      {...rest}
      type="date"
      className={joinClasses(controlStyle, 'max-w-56', className)}
    />
  );
}
