import { Check } from 'lucide-react';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { formatShortDay } from '../../../lib/format.ts';
import { joinClasses } from '../../../lib/join-classes.ts';

type Status = ShredList['status'];
const reached: Record<Status, number> = { draft: 1, sent: 2, approved: 3, done: 4, void: 0 };

/** The four steps of a list with their days; the line fills as it moves on. */
export function StageTrack({ list }: { list: ShredList }) {
  const at = reached[list.status];
  const steps = [
    { name: 'Gathered', on: list.createdAt },
    { name: 'Sent', on: list.sentAt },
    { name: 'Agreed', on: list.approval?.on ?? null },
    { name: 'Shredded', on: list.destruction?.on ?? null },
  ];
  return (
    <ol aria-label="How far the list is" className="mb-6 grid max-w-3xl grid-cols-4 gap-1">
      {steps.map((step, i) => {
        const isDone = i < at;
        return (
          <li key={step.name} aria-current={i === at - 1 ? 'step' : undefined}>
            <span
              aria-hidden
              className={joinClasses(
                'mb-2 block h-1 rounded-full',
                isDone ? (i === 3 ? 'bg-rust' : 'bg-teal') : 'bg-line',
              )}
            />
            <span
              className={joinClasses(
                'flex items-center gap-1 text-sm',
                isDone ? 'font-semibold' : 'text-ink-faint',
              )}
            >
              {isDone ? <Check aria-hidden className="size-4 shrink-0 max-sm:hidden" /> : null}
              {step.name}
              {isDone ? null : <span className="sr-only">, not yet</span>}
            </span>
            {isDone && step.on ? (
              <span className="block text-xs text-ink-soft sm:text-sm">
                {formatShortDay(step.on)}
              </span>
            ) : null}
          </li>
        );
      })}
    </ol>
  );
}
