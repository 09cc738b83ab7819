import { classLabel, type ClassId } from '../../../../server/contract/document-classes.ts';
import type { Paper } from '../../../../server/contract/papers.ts';
import { Badge } from '../../../components/ui/badge.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { KeyHint } from '../../../components/ui/key-hint.tsx';
import { describeConfidence } from '../logic/words.ts';

interface KindSectionProps {
  paper: Paper;
  mayReview: boolean;
  onChange: () => void;
  onChoose: (kind: ClassId) => void;
}

const shownEvidence = 4;
const shownCandidates = 3;

/** What kind of paper the reader takes it for, how sure it is, and the words it saw. */
export function KindSection({ paper, mayReview, onChange, onChoose }: KindSectionProps) {
  const evidence = paper.candidates.find(({ class: kind }) => kind === paper.class)?.evidence ?? [];
  const others = paper.candidates
    .filter(({ class: kind }) => kind !== paper.class)
    .slice(0, shownCandidates);
  const readAs = paper.read?.class;
  return (
    <section aria-label="Kind of paper" className="space-y-2">
      <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
        <Badge tone={paper.confidence !== null && paper.confidence < 0.7 ? 'soon' : 'neutral'}>
          {describeConfidence(paper.confidence)}
        </Badge>
        {mayReview && (
          <Button tone="plain" size="small" onClick={onChange}>
            Change kind <KeyHint keys="K" />
          </Button>
        )}
      </div>
      {readAs && readAs !== paper.class && (
        <p className="text-sm text-ink-soft">The reader took it for: {classLabel(readAs)}.</p>
      )}
      {evidence.length > 0 && (
        <p className="text-sm text-ink-soft">
          It says{' '}
          {evidence.slice(0, shownEvidence).map((words, index) => (
            <span key={words}>
              {index > 0 && ', '}
              <q className="text-ink">{words}</q>
            </span>
          ))}
          .
        </p>
      )}
      {mayReview && paper.confidence !== null && others.length > 0 && (
        <div className="flex flex-wrap items-center gap-2 text-sm text-ink-soft">
          <span>Or is it</span>
          {others.map(({ class: kind }) => (
            <Button key={kind} size="small" onClick={() => onChoose(kind)}>
              {classLabel(kind)}
            </Button>
          ))}
        </div>
      )}
    </section>
  );
}
