import type { ReactNode } from 'react';
import { joinClasses } from '../../lib/join-classes.ts';

export type BadgeTone = 'neutral' | 'good' | 'soon' | 'danger' | 'hold';

const tones: Record<BadgeTone, string> = {
  neutral: 'bg-paper-sunk text-ink-soft',
  good: 'bg-teal-wash text-teal-strong',
  soon: 'bg-amber-wash text-amber-strong',
  danger: 'bg-rust-wash text-rust-strong',
  hold: 'bg-violet-wash text-violet-strong',
};

interface BadgeProps {
  tone?: BadgeTone;
  icon?: ReactNode;
  className?: string;
  children: ReactNode;
}

/** A state in one or two words. The words carry the meaning; the colour only helps. */
export function Badge({ tone = 'neutral', icon, className, children }: BadgeProps) {
  return (
    <span
      className={joinClasses(
        'inline-flex items-center gap-1 rounded px-2 py-0.5 text-sm font-semibold whitespace-nowrap [&>svg]:size-4',
        tones[tone],
        className,
      )}
    >
      {icon}
      {children}
    </span>
  );
}
