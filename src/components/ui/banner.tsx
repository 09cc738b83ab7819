import type { ReactNode } from 'react';
import { CircleAlert, CircleCheck, Clock, Hand, Info } from 'lucide-react';
import { joinClasses } from '../../lib/join-classes.ts';

export type BannerTone = 'info' | 'good' | 'soon' | 'fault' | 'hold';

const looks: Record<BannerTone, { style: string; icon: typeof Info }> = {
  info: { style: 'border-line-strong bg-paper-sunk text-ink', icon: Info },
  good: { style: 'border-teal bg-teal-wash text-teal-strong', icon: CircleCheck },
  soon: { style: 'border-amber bg-amber-wash text-amber-strong', icon: Clock },
  fault: { style: 'border-amber-strong bg-amber-wash text-amber-strong', icon: CircleAlert },
  hold: { style: 'border-violet bg-violet-wash text-violet-strong', icon: Hand },
};

interface BannerProps {
  tone?: BannerTone;
  title?: ReactNode;
  /** Interrupts those who listen. For what just went wrong. */
  alert?: boolean;
  /** A button at its end. */
  action?: ReactNode;
  className?: string;
  children?: ReactNode;
}

/** A message that stays where it is. Amber asks for attention, violet says "don't destroy yet". */
export function Banner({
  tone = 'info',
  title,
  alert = false,
  action,
  className,
  children,
}: BannerProps) {
  const { style, icon: Icon } = looks[tone];
  return (
    <div
      role={alert ? 'alert' : undefined}
      className={joinClasses(
        'flex flex-wrap items-start gap-x-3 gap-y-2 rounded-md border-l-4 px-4 py-3',
        style,
        className,
      )}
    >
      <Icon aria-hidden className="mt-0.5 size-5 shrink-0" />
      <div className="min-w-0 flex-1 basis-60">
        {title ? <p className="font-semibold">{title}</p> : null}
        {children ? <div className="text-sm">{children}</div> : null}
      </div>
      {action}
    </div>
  );
}
