import type { ShredRow } from '../../../../server/contract/shred-lists.ts';
import { joinClasses } from '../../../lib/join-classes.ts';
import type { Outcome } from '../logic/outcomes.ts';
import { outcomeWords } from '../logic/words.ts';

interface OutcomeChoiceProps {
  row: ShredRow;
  value: Outcome | undefined;
  /** A paper that may not go now cannot have been shredded rightly. */
  onChange: (outcome: Outcome) => void;
}

const looks: Record<Outcome, string> = {
  destroyed: 'has-checked:border-rust has-checked:bg-rust-wash has-checked:text-rust-strong',
  'kept-back': 'has-checked:border-teal has-checked:bg-teal-wash has-checked:text-teal-strong',
  'not-found': 'has-checked:border-amber has-checked:bg-amber-wash has-checked:text-amber-strong',
};

/** What became of one paper at the shredder. */
export function OutcomeChoice({ row, value, onChange }: OutcomeChoiceProps) {
  return (
    <fieldset className="min-w-0">
      <legend className="sr-only">What became of paper {row.paperNumber}</legend>
      <div className="flex flex-wrap gap-2">
        {(['destroyed', 'kept-back', 'not-found'] as const).map((outcome) => {
          const isShut = outcome === 'destroyed' && row.blocked.length > 0;
          return (
            <label
              key={outcome}
              className={joinClasses(
                'relative flex min-h-11 cursor-pointer items-center rounded-md border border-line-strong px-3 text-sm font-semibold has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-teal',
                looks[outcome],
                isShut && 'cursor-not-allowed opacity-50',
              )}
            >
              <input
                type="radio"
                name={`outcome-${row.paper}`}
                checked={value === outcome}
                disabled={isShut}
                onChange={() => onChange(outcome)}
                className="absolute inset-0 cursor-pointer opacity-0"
              />
              {outcomeWords[outcome]}
            </label>
          );
        })}
      </div>
    </fieldset>
  );
}
