import { joinClasses } from '../../lib/join-classes.ts';

export type ButtonTone = 'primary' | 'quiet' | 'plain' | 'danger' | 'hold';
export type ButtonSize = 'normal' | 'small';

const tones: Record<ButtonTone, string> = {
  primary: 'border-teal bg-teal text-white hover:bg-teal-strong hover:border-teal-strong',
  quiet: 'border-line-strong bg-paper-raised text-ink hover:bg-paper-sunk',
  plain: 'border-transparent text-teal-strong hover:bg-teal-wash',
  danger: 'border-rust bg-rust text-white hover:bg-rust-strong hover:border-rust-strong',
  hold: 'border-violet bg-violet-wash text-violet-strong hover:bg-violet hover:text-white',
};

const sizes: Record<ButtonSize, string> = {
  normal: 'min-h-11 px-4 py-2 text-base',
  small: 'min-h-9 px-3 py-1 text-sm pointer-coarse:min-h-11',
};

/** The classes of something pressed like a button. */
export function styleButton(tone: ButtonTone = 'quiet', size: ButtonSize = 'normal'): string {
  return joinClasses(
    'inline-flex items-center justify-center gap-2 rounded-md border font-semibold no-underline',
    'transition-colors disabled:cursor-not-allowed disabled:opacity-55 [&>svg]:size-[1.15em] [&>svg]:shrink-0',
    tones[tone],
    sizes[size],
  );
}
