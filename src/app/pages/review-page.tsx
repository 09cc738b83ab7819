import { useCallback } from 'react';
import { useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { ReviewDesk } from '../../features/review/components/review-desk.tsx';
import { parseRound } from '../../features/review/logic/queue.ts';
import { sittingOf } from '../../features/review/logic/sitting.ts';
import { paths } from '../../lib/paths.ts';
import { useSession } from '../../lib/session.ts';

/** Looking through papers: one at a time, and a second look at the undecided. */
export function Component() {
  const { householdId = '', paperId } = useParams();
  const [search] = useSearchParams();
  const navigate = useNavigate();
  const round = parseRound(search.get('round'));
  const userId = useSession()?.user?.id;
  const goTo = useCallback(
    (next: string | null) => {
      const tail = round === 'second' ? '?round=second' : '';
      void navigate(`${paths.review(householdId, next ?? undefined)}${tail}`);
    },
    [navigate, householdId, round],
  );
  if (!userId) return null;
  return (
    <ReviewDesk
      key={`${householdId} ${round}`}
      householdId={householdId}
      paperId={paperId ?? null}
      round={round}
      sitting={sittingOf(userId, householdId)}
      onGo={goTo}
    />
  );
}
