import { pileLabels, piles, type Pile } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { joinClasses } from '../../../lib/join-classes.ts';

interface PilesDialogProps {
  chosen: Pile | null;
  suggested: Pile | null;
  onChoose: (pile: Pile) => void;
  onClose: () => void;
}

/** The eight piles, large, for a thumb. */
export function PilesDialog({ chosen, suggested, onChoose, onClose }: PilesDialogProps) {
  return (
    <Dialog open onOpenChange={onClose} title="Where does it go?">
      <div className="grid grid-cols-2 gap-2">
        {piles.map((pile) => (
          <Button
            key={pile}
            aria-pressed={pile === chosen}
            className={joinClasses(
              'min-h-14 w-full flex-col gap-0!',
              pile === chosen && 'border-teal! bg-teal-wash!',
            )}
            onClick={() => onChoose(pile)}
          >
            {pileLabels[pile]}
            {pile === suggested && (
              <span className="text-xs font-normal text-teal-strong">suggested</span>
            )}
          </Button>
        ))}
      </div>
    </Dialog>
  );
}
