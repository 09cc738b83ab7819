import type { ComponentProps } from 'react';
import { joinClasses } from '../../lib/join-classes.ts';
import { controlStyle } from './control-style.ts';

/** One line of text. */
export function TextInput({ className, type = 'text', ...rest }: ComponentProps<'input'>) {
  return <input {...rest} type={type} className={joinClasses(controlStyle, className)} />;
}

/** Several lines of text. */
export function TextArea({ className, rows = 3, ...rest }: ComponentProps<'textarea'>) {
  return <textarea {...rest} rows={rows} className={joinClasses(controlStyle, className)} />;
}
