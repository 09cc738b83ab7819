import type { Household, Outflow } from '../../../../server/contract/households.ts';
import type { Permission } from '../../../../server/contract/permissions.ts';
import { formatCount } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';

export interface WaitingStep {
  key: string;
  /** What waits, with its number. */
  title: string;
  /** Why it matters, in a few words. */
  why: string;
  /** What the button says. */
  go: string;
  to: string;
  tone: 'way' | 'hold';
}

interface Waiting {
  household: Household;
  outflow: Outflow | undefined;
  /** Shred lists that wait for approval. */
  listsToApprove: readonly { id: string; papers: number }[];
  /** The tax year whose answer would settle most papers. */
  filingQuestion: { taxYear: string; papers: number } | undefined;
  may: (permission: Permission) => boolean;
}

/** What waits in a household, the next step first; only what this person may do. */
export function listWaiting({
  household,
  outflow,
  listsToApprove,
  filingQuestion,
  may,
}: Waiting): WaitingStep[] {
  const { counts, id } = household;
  const steps: (WaitingStep | false)[] = [
    ...listsToApprove.map(
      (list): WaitingStep | false =>
        may('shred-list:approve') && {
          key: `approve-${list.id}`,
          title: `${formatCount(list.papers, 'paper')} wait for a yes before shredding`,
          why: 'Look at each, keep back what should stay, approve the rest.',
          go: 'Look at the list',
          to: paths.shredList(list.id),
          tone: 'way',
        },
    ),
    counts.toReview > 0 &&
      may('paper:review') && {
        key: 'review',
        title: `${formatCount(counts.toReview, 'paper')} to look at`,
        why: 'They are read. A person decides what becomes of each.',
        go: 'Look through',
        to: paths.review(id),
        tone: 'way',
      },
    counts.reading > 0 &&
      may('box:read') && {
        key: 'reading',
        title: `${formatCount(counts.reading, 'scan')} still being read`,
        why: 'Work can go on meanwhile.',
        go: 'See how far it is',
        to: paths.boxes(id),
        tone: 'way',
      },
    filingQuestion !== undefined &&
      may('subject:write') && {
        key: 'filing',
        title: `When was the return for ${filingQuestion.taxYear} sent?`,
        why: `The answer settles ${formatCount(filingQuestion.papers, 'paper')}.`,
        go: 'Answer',
        to: `${paths.about(id)}#returns`,
        tone: 'way',
      },
    counts.undecided > 0 &&
      may('paper:review') && {
        key: 'undecided',
        title: `${formatCount(counts.undecided, 'paper')} still undecided`,
        why: 'A second look later is often easier.',
        go: 'Look again',
        to: `${paths.review(id)}?round=undecided`,
        tone: 'way',
      },
    counts.leaving > 0 &&
      may('shred-list:prepare') && {
        key: 'leaving',
        title: `${formatCount(counts.leaving, 'paper')} set aside to leave`,
        why: 'Gather them into a list, have it approved, then record what went.',
        go: 'Let go',
        to: paths.shredLists(id),
        tone: 'way',
      },
    (outflow?.dueNow ?? 0) > 0 &&
      counts.leaving === 0 &&
      may('paper:read') && {
        key: 'due',
        title: `${formatCount(outflow?.dueNow ?? 0, 'sheet')} past their date`,
        why: 'They need not be kept any longer. Nothing leaves without a yes.',
        go: 'See which',
        to: paths.papers(id, { dueBy: household.today, sort: 'shredFrom' }),
        tone: 'way',
      },
    counts.boxes === 0 &&
      may('box:write') && {
        key: 'first-box',
        title: 'No box has been opened yet',
        why: 'A box is where papers come from: a drawer, a shelf, a carton.',
        go: 'Open the first box',
        to: paths.boxes(id),
        tone: 'way',
      },
    counts.holds > 0 &&
      may('hold:read') && {
        key: 'holds',
        title: `“Don’t destroy yet” is set ${counts.holds === 1 ? 'once' : `${counts.holds} times`}`,
        why: 'What it covers stays, whatever the date.',
        go: 'See why',
        to: paths.holds(id),
        tone: 'hold',
      },
  ];
  return steps.filter((step) => step !== false);
}
