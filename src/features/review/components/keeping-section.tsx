import { Hand, MapPin, MessageSquare, Scissors, Link2 } from 'lucide-react';
import { pileLabels, type Paper } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { KeyHint } from '../../../components/ui/key-hint.tsx';
import type { ReviewCommand } from '../logic/key-map.ts';
import { keptBecauseHints, keptBecauseLabels } from '../logic/words.ts';

interface KeepingSectionProps {
  paper: Paper;
  mayReview: boolean;
  mayHold: boolean;
  mayCut: boolean;
  onCommand: (command: ReviewCommand) => void;
}

/** Where it is kept and why, what was noted, and what else can be done with the paper. */
export function KeepingSection({
  paper,
  mayReview,
  mayHold,
  mayCut,
  onCommand,
}: KeepingSectionProps) {
  const hasNeighbour = paper.previousInScan !== null || paper.nextInScan !== null;
  const words = [
    paper.pile && ['Pile', pileLabels[paper.pile]],
    paper.keptBecause && [
      'Kept because',
      `${keptBecauseLabels[paper.keptBecause]}: ${keptBecauseHints[paper.keptBecause]}`,
    ],
    paper.place && ['Place', paper.place],
    paper.subjectName && ['About', paper.subjectName],
    paper.note && ['Note', paper.note],
    paper.practiceNote && ['Practice only', paper.practiceNote],
    paper.reviewedByName && ['Decided by', paper.reviewedByName],
  ].filter((line) => Array.isArray(line));
  return (
    <section aria-label="Keeping and notes" className="space-y-3 text-sm">
      {words.length > 0 && (
        <dl className="divide-y divide-line border-y border-line">
          {words.map(([label, value]) => (
            <div key={label} className="grid grid-cols-[8.5rem_minmax(0,1fr)] gap-x-3 px-2 py-1.5">
              <dt className="text-ink-soft">{label}</dt>
              <dd className="min-w-0 break-words whitespace-pre-line">{value}</dd>
            </div>
          ))}
        </dl>
      )}
      <div className="flex flex-wrap gap-2">
        {mayReview && (
          <>
            <Button
              size="small"
              icon={<MapPin aria-hidden />}
              onClick={() => onCommand({ does: 'place' })}
            >
              Place and why <KeyHint keys="P" />
            </Button>
            <Button
              size="small"
              icon={<MessageSquare aria-hidden />}
              onClick={() => onCommand({ does: 'note' })}
            >
              Note <KeyHint keys="N" />
            </Button>
          </>
        )}
        {mayHold && (
          <Button
            tone="hold"
            size="small"
            icon={<Hand aria-hidden />}
            onClick={() => onCommand({ does: 'hold' })}
          >
            Don’t destroy yet <KeyHint keys="H" />
          </Button>
        )}
        {mayReview && hasNeighbour && (
          <Button
            size="small"
            icon={<Link2 aria-hidden />}
            onClick={() => onCommand({ does: 'join' })}
          >
            Join <KeyHint keys="J" />
          </Button>
        )}
        {mayCut && (
          <Button
            size="small"
            icon={<Scissors aria-hidden />}
            onClick={() => onCommand({ does: 'cut' })}
          >
            Cut apart <KeyHint keys="C" />
          </Button>
        )}
      </div>
    </section>
  );
}
