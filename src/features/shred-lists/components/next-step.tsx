import type { ReactNode } from 'react';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { formatDay } from '../../../lib/format.ts';
import { decideReadiness } from '../logic/consent.ts';
import { listBlocked } from '../logic/keep-back.ts';

interface Step {
  title: string;
  words: string;
}

interface NextStepProps {
  list: ShredList;
  /** The household's day. */
  today: string;
  /** What is being done just now, in place of where the list stands. */
  task: 'own-consent' | 'instruction' | 'destruction' | null;
  children?: ReactNode;
}

const taskSteps: Record<'own-consent' | 'instruction' | 'destruction', Step> = {
  'own-consent': {
    title: 'Look through it and decide',
    words:
      'Press a picture to see the whole paper. Keep whatever you like, for any reason or none. Then agree to the rest.',
  },
  instruction: {
    title: 'What did the client say?',
    words: 'Keep back what they want to keep, then write down their words for the rest.',
  },
  destruction: {
    title: 'What became of each paper?',
    words:
      'Say it paper by paper, at the shredder if you can. It is kept on this device until you record it.',
  },
};

/** Where the list stands and what comes next, in two sentences, with the way on beside them. */
export function NextStep({ list, today, task, children }: NextStepProps) {
  const { title, words } = task ? taskSteps[task] : describeNext(list, today);
  return (
    <section
      aria-labelledby="next-step"
      className="mb-6 flex flex-wrap items-center justify-between gap-x-8 gap-y-4 rounded-lg border border-line bg-paper-raised p-4 sm:p-5"
    >
      <div className="min-w-0 flex-1 basis-72">
        <h2 id="next-step" className="text-lg font-semibold">
          {title}
        </h2>
        <p className="mt-0.5 max-w-prose text-ink-soft">{words}</p>
      </div>
      {children ? <div className="flex flex-wrap gap-3">{children}</div> : null}
    </section>
  );
}

function describeNext(list: ShredList, today: string): Step {
  const going = list.rows.filter((row) => !row.keptBack);
  const blocked = listBlocked(list.rows).length;
  switch (list.status) {
    case 'draft':
      if (going.length === 0) {
        return {
          title: 'Nothing may go',
          words:
            list.leftOut.length > 0
              ? 'Why each paper stays is written below. Give this list up, and gather again once the reasons are settled.'
              : 'No paper lies on the shred pile. Look through papers first, then gather again.',
        };
      }
      if (blocked > 0) {
        return {
          title: 'Some papers may not go now',
          words: 'The reason stands beside each. Take them off before the client is asked.',
        };
      }
      return {
        title: 'Ready to send',
        words: 'Look it over and take off what does not belong. Then the client is asked.',
      };
    case 'sent':
      return list.can.approve || list.can.void
        ? {
            title: 'Waiting for the client',
            words: 'They look through it, keep back what they want, and agree to the rest.',
          }
        : {
            title: 'Waiting for an answer',
            words: 'Somebody of the household looks through it and agrees, or keeps papers back.',
          };
    case 'approved':
      return describeAgreed(list, today);
    case 'done': {
      const destroyed = list.rows.filter((row) => row.outcome === 'destroyed').length;
      return {
        title: `${destroyed} of ${list.rows.length} papers shredded`,
        words: 'The record stays with the household for good, and can be printed.',
      };
    }
    case 'void':
      return {
        title: 'Given up',
        words: 'Nothing on this list was shredded. Its papers stayed where they were.',
      };
  }
}

function describeAgreed({ approval }: ShredList, today: string): Step {
  const readiness = decideReadiness(approval, today);
  switch (readiness.kind) {
    case 'waiting':
      return {
        title: `Agreed. Shredding from ${formatDay(readiness.notBefore)}`,
        words: 'Sooner only while the client is there. Print the list to work from it.',
      };
    case 'lapsed':
      return {
        title: 'The agreement is too old',
        words: `It held until ${formatDay(readiness.lapsedOn)}. Give this list up, gather a new one and ask again.`,
      };
    default:
      return {
        title: 'Ready to be shredded',
        words: `Print the list, shred what is on it, then record it here${approval ? ` by ${formatDay(approval.lapsesOn)}` : ''}.`,
      };
  }
}
