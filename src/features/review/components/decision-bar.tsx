import { Check, SkipForward, Undo2 } from 'lucide-react';
import { pileLabels, piles, type Pile } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { KeyHint } from '../../../components/ui/key-hint.tsx';
import { joinClasses } from '../../../lib/join-classes.ts';
import type { ReviewCommand } from '../logic/key-map.ts';

interface DecisionBarProps {
  chosen: Pile | null;
  suggested: Pile | null;
  mayUndo: boolean;
  onCommand: (command: ReviewCommand) => void;
}

/** The decision, for a screen with room: keep it as suggested, or one of the eight piles. */
export function DecisionBar({ chosen, suggested, mayUndo, onCommand }: DecisionBarProps) {
  return (
    <section
      aria-label="Decide"
      className="space-y-2 border-t border-line bg-paper-raised px-5 py-3"
    >
      <Button
        tone="primary"
        className="w-full"
        icon={<Check aria-hidden />}
        onClick={() => onCommand({ does: 'accept' })}
      >
        Keep it <KeyHint keys="Enter" />
      </Button>
      <div role="group" aria-label="Piles" className="grid grid-cols-2 gap-2">
        {piles.map((pile, index) => (
          <Button
            key={pile}
            size="small"
            aria-pressed={pile === chosen}
            className={joinClasses(
              'w-full justify-between! pl-2!',
              pile === chosen && 'border-teal! bg-teal-wash!',
            )}
            onClick={() => onCommand({ does: 'pile', pile })}
          >
            <span className="flex items-center gap-2">
              <KeyHint keys={String(index + 1)} />
              {pileLabels[pile]}
            </span>
            {pile === suggested && pile !== chosen && (
              <span className="text-xs font-normal text-teal-strong">suggested</span>
            )}
          </Button>
        ))}
      </div>
      <div className="flex justify-between gap-2">
        <Button
          tone="plain"
          size="small"
          icon={<Undo2 aria-hidden />}
          disabled={!mayUndo}
          onClick={() => onCommand({ does: 'undo' })}
        >
          Undo <KeyHint keys="Z" />
        </Button>
        <Button
          tone="plain"
          size="small"
          icon={<SkipForward aria-hidden />}
          onClick={() => onCommand({ does: 'skip' })}
        >
          Next, decide later <KeyHint keys="S" />
        </Button>
      </div>
    </section>
  );
}
