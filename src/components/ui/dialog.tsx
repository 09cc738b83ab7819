import type { ReactNode } from 'react';
import { X } from 'lucide-react';
import { Dialog as Radix } from 'radix-ui';
import { joinClasses } from '../../lib/join-classes.ts';

interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: string;
  /** One or two sentences under the title. */
  description?: ReactNode;
  /** What opens it, when it is not opened by the caller's own state. */
  trigger?: ReactNode;
  /** Buttons, the way forward last. */
  footer?: ReactNode;
  width?: 'normal' | 'wide';
  children?: ReactNode;
}

/** A question in front of the screen. Escape and the cross close it; focus goes back where it was. */
export function Dialog({
  open,
  onOpenChange,
  title,
  description,
  trigger,
  footer,
  width = 'normal',
  children,
}: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      {trigger ? <Radix.Trigger asChild>{trigger}</Radix.Trigger> : null}
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-ink/45" />
        <Radix.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={joinClasses(
            'fixed z-50 flex max-h-[92dvh] flex-col overflow-hidden bg-paper-raised shadow-xl',
            'inset-x-0 bottom-0 rounded-t-xl sm:inset-x-auto sm:top-1/2 sm:bottom-auto sm:left-1/2',
            'sm:w-[calc(100vw-3rem)] sm:-translate-x-1/2 sm:-translate-y-1/2 sm:rounded-xl',
            width === 'wide' ? 'sm:max-w-4xl' : 'sm:max-w-lg',
          )}
        >
          <div className="flex items-start justify-between gap-4 px-5 pt-4">
            <Radix.Title className="pt-1.5 text-xl font-semibold">{title}</Radix.Title>
            <Radix.Close
              aria-label="Close"
              className="-mr-2 inline-flex size-11 shrink-0 items-center justify-center rounded-md text-ink-soft hover:bg-paper-sunk"
            >
              <X aria-hidden className="size-5" />
            </Radix.Close>
          </div>
          <div className="min-h-0 flex-1 overflow-y-auto px-5 pt-1 pb-5">
            {description ? (
              <Radix.Description asChild>
                <div className="text-ink-soft">{description}</div>
              </Radix.Description>
            ) : null}
            {children ? <div className="mt-4">{children}</div> : null}
          </div>
          {footer ? (
            <div className="flex flex-wrap justify-end gap-3 border-t border-line px-5 py-3">
              {footer}
            </div>
          ) : null}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
