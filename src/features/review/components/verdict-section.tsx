import { Button } from '../../../components/ui/button.tsx';
import { KeyHint } from '../../../components/ui/key-hint.tsx';
import type { Paper } from '../../../../server/contract/papers.ts';
import { formatDay } from '../../../lib/format.ts';
import { joinClasses } from '../../../lib/join-classes.ts';
import { decideVerdict, listVerdictLines, type VerdictTone } from '../logic/words.ts';

const tones: Record<VerdictTone, string> = {
  held: 'border-violet bg-violet-wash text-violet-strong',
  permanent: 'border-ink bg-paper-sunk text-ink',
  open: 'border-line-strong bg-paper-sunk text-ink',
  keep: 'border-teal bg-teal-wash text-teal-strong',
  soon: 'border-amber bg-amber-wash text-amber-strong',
  free: 'border-line-strong bg-paper-raised text-ink',
};

interface VerdictSectionProps {
  paper: Paper;
  today: string;
  /** The dates shown are old: a change is on its way. */
  isWorking: boolean;
  onStepDown: (() => void) | null;
}

/** How long this paper is kept, in one line and what follows from it. */
export function VerdictSection({ paper, today, isWorking, onStepDown }: VerdictSectionProps) {
  const verdict = decideVerdict(paper, today);
  return (
    <section aria-label="How long it is kept" aria-busy={isWorking}>
      <div className={joinClasses('rounded-md border-l-4 px-4 py-3', tones[verdict.tone])}>
        <p className="text-lg leading-snug font-semibold tabular-nums">
          {verdict.headline}
          {verdict.on && ` ${formatDay(verdict.on)}`}
        </p>
        {listVerdictLines(paper, formatDay).map((line) => (
          <p
            key={line.text}
            className={joinClasses('text-sm tabular-nums', line.tone === 'soft' && 'opacity-85')}
          >
            {line.text}
          </p>
        ))}
        <p role="status" className="text-sm font-semibold empty:hidden">
          {isWorking ? 'Working the dates out anew …' : ''}
        </p>
      </div>
      {onStepDown && (
        <Button tone="plain" size="small" className="mt-1" onClick={onStepDown}>
          Take the shorter time <KeyHint keys="T" />
        </Button>
      )}
    </section>
  );
}
