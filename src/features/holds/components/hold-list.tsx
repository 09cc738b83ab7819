import { Link } from 'react-router-dom';
import { type Hold, holdKindLabels } from '../../../../server/contract/holds.ts';
import { Button } from '../../../components/ui/button.tsx';
import { formatDay } from '../../../lib/format.ts';
import { joinClasses } from '../../../lib/join-classes.ts';
import { paths } from '../../../lib/paths.ts';

/** Holds with what they cover, who set them and why. */
export function HoldList({ holds, onLift }: { holds: Hold[]; onLift?: (hold: Hold) => void }) {
  return (
    <ul className="space-y-3">
      {holds.map((hold) => (
        <li
          key={hold.id}
          className={joinClasses(
            'flex flex-wrap items-start justify-between gap-x-6 gap-y-2 rounded-lg border-l-4 bg-paper-raised px-4 py-3',
            hold.liftedOn ? 'border-line-strong' : 'border-violet',
          )}
        >
          <div className="min-w-0 flex-1 basis-72">
            <p className="font-semibold">
              {hold.paperId ? (
                <Link to={paths.review(hold.householdId, hold.paperId)} className="underline">
                  {hold.paperLabel}
                </Link>
              ) : (
                'Everything in the household'
              )}
              <span className="font-normal text-ink-soft"> · {holdKindLabels[hold.kind]}</span>
            </p>
            <p>{hold.reason}</p>
            <p className="mt-1 text-sm text-ink-soft">
              Set by {hold.placedByName} on {formatDay(hold.placedOn)}
              {hold.reviewOn && !hold.liftedOn
                ? `, to look at again on ${formatDay(hold.reviewOn)}`
                : ''}
              {hold.liftedOn
                ? `. Lifted by ${hold.liftedByName ?? 'somebody'} on ${formatDay(hold.liftedOn)}: ${hold.liftReason ?? ''}`
                : ''}
            </p>
          </div>
          {onLift && hold.liftable ? (
            <Button aria-label={`Lift: ${hold.reason}`} onClick={() => onLift(hold)}>
              Lift
            </Button>
          ) : null}
        </li>
      ))}
    </ul>
  );
}
