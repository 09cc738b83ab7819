import type { ComponentProps, ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { LinkProps } from 'react-router-dom';
import { joinClasses } from '../../lib/join-classes.ts';
import { styleButton } from './button-style.ts';
import type { ButtonSize, ButtonTone } from './button-style.ts';
import { Spinner } from './spinner.tsx';

interface ButtonProps extends ComponentProps<'button'> {
  tone?: ButtonTone;
  size?: ButtonSize;
  /** Shown before the words. */
  icon?: ReactNode;
  /** While true the button says so and cannot be pressed again. */
  busy?: boolean;
}

/** A button. Rust (`danger`) is for destruction alone. */
export function Button({
  tone = 'quiet',
  size = 'normal',
  icon,
  busy = false,
  className,
  children,
  disabled,
  type = 'button',
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      disabled={disabled === true || busy}
      aria-busy={busy || undefined}
      className={joinClasses(styleButton(tone, size), className)}
    >
      {busy ? <Spinner /> : icon}
      {children}
    </button>
  );
}

interface LinkButtonProps extends LinkProps {
  tone?: ButtonTone;
  size?: ButtonSize;
  icon?: ReactNode;
}

/** A link to a place in the application that looks like a button. */
export function LinkButton({
  tone = 'quiet',
  size = 'normal',
  icon,
  className,
  children,
  ...rest
}: LinkButtonProps) {
  return (
    <Link {...rest} className={joinClasses(styleButton(tone, size), className)}>
      {icon}
      {children}
    </Link>
  );
}

interface FileLinkProps extends ComponentProps<'a'> {
  href: string;
  tone?: ButtonTone;
  size?: ButtonSize;
  icon?: ReactNode;
}

/** A link to a file that the server makes (PDF, CSV), looking like a button. */
export function FileLink({
  tone = 'quiet',
  size = 'normal',
  icon,
  className,
  children,
  ...rest
}: FileLinkProps) {
  return (
    <a {...rest} className={joinClasses(styleButton(tone, size), className)}>
      {icon}
      {children}
    </a>
  );
}
