import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { PageHeading } from '../../../components/layout/page-heading.tsx';
import { LinkButton } from '../../../components/ui/button.tsx';
import { formatCount } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { useMay } from '../../../lib/use-may.ts';
import { householdQuery } from '../api/get-household.ts';
import type { Round } from '../logic/queue.ts';

interface ReviewDoneProps {
  householdId: string;
  round: Round;
  notices: ReactNode;
  onSecondRound: () => void;
}

/** The end of a round: what was reached, and the next step. */
export function ReviewDone({ householdId, round, notices, onSecondRound }: ReviewDoneProps) {
  const { data: household } = useQuery(householdQuery(householdId));
  const mayPrepare = useMay('shred-list:prepare', householdId);
  const counts = household?.counts;
  const undecided = counts?.undecided ?? 0;
  const reading = counts?.reading ?? 0;
  return (
    <div className="mx-auto flex w-full max-w-2xl flex-1 flex-col justify-center px-4 py-10 sm:px-6">
      {notices}
      <PageHeading
        title={round === 'first' ? 'Every paper has been looked at' : 'That was the second look'}
        tabTitle="Look through"
      >
        {reading > 0 && (
          <p>{formatCount(reading, 'file')} still being read: papers from them come here.</p>
        )}
        {undecided > 0 ? (
          <p>
            {formatCount(undecided, 'paper')} left undecided. They may stay so, or you look once
            more.
          </p>
        ) : (
          reading === 0 && <p>Nothing is waiting for a decision.</p>
        )}
      </PageHeading>
      <div className="flex flex-wrap gap-3">
        {undecided > 0 && (
          <LinkButton
            tone="primary"
            to={`${paths.review(householdId)}?round=second`}
            onClick={onSecondRound}
          >
            Look at the undecided
          </LinkButton>
        )}
        {mayPrepare && (counts?.leaving ?? 0) > 0 && (
          <LinkButton tone={undecided > 0 ? 'quiet' : 'primary'} to={paths.shredLists(householdId)}>
            Gather what may go
          </LinkButton>
        )}
        <LinkButton to={paths.papers(householdId)}>All papers</LinkButton>
        <LinkButton to={paths.household(householdId)}>Overview</LinkButton>
      </div>
    </div>
  );
}
