import type { Paper } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { KeyHint } from '../../../components/ui/key-hint.tsx';
import { formatDay } from '../../../lib/format.ts';
import { joinClasses } from '../../../lib/join-classes.ts';
import { listFactLines, type FactLine } from '../logic/fact-lines.ts';

interface FactsSectionProps {
  paper: Paper;
  mayReview: boolean;
  activeMark: string | null;
  onActiveMark: (key: string | null) => void;
  onShowPage: (pageNumber: number) => void;
  onCorrect: () => void;
}

/** What was read on the paper; each line shows its place on the page. */
export function FactsSection({
  paper,
  mayReview,
  activeMark,
  onActiveMark,
  onShowPage,
  onCorrect,
}: FactsSectionProps) {
  const lines = listFactLines(paper, formatDay);
  return (
    <section aria-labelledby="facts-heading" className="text-sm">
      <div className="flex items-center justify-between gap-3">
        <h2 id="facts-heading" className="font-semibold">
          What it says
        </h2>
        {mayReview && (
          <Button tone="plain" size="small" onClick={onCorrect}>
            Correct <KeyHint keys="D" />
          </Button>
        )}
      </div>
      {lines.length === 0 ? (
        <p className="text-ink-soft">No date, sender or reference was found on it.</p>
      ) : (
        <ul className="divide-y divide-line border-y border-line">
          {lines.map((line) => (
            <li key={line.key}>
              {line.page === null ? (
                <div className="px-2 py-1.5">
                  <FactWords line={line} />
                </div>
              ) : (
                <button
                  type="button"
                  className={joinClasses(
                    'block w-full px-2 py-1.5 text-left pointer-coarse:min-h-11',
                    line.key === activeMark ? 'bg-teal-wash' : 'hover:bg-paper-sunk',
                  )}
                  onPointerEnter={() => onActiveMark(line.key)}
                  onPointerLeave={() => onActiveMark(null)}
                  onFocus={() => onActiveMark(line.key)}
                  onBlur={() => onActiveMark(null)}
                  onClick={() => {
                    onShowPage(line.page ?? 1);
                    onActiveMark(line.key);
                  }}
                >
                  <FactWords line={line} />
                </button>
              )}
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}

function FactWords({ line }: { line: FactLine }) {
  return (
    <span className="grid grid-cols-[8.5rem_minmax(0,1fr)] gap-x-3">
      <span className="text-ink-soft">{line.label}</span>
      <span className="min-w-0 break-words tabular-nums">
        {line.value ?? <span className="text-ink-soft">none</span>}
        {line.wasRead !== undefined && (
          <span className="block text-ink-soft">
            corrected; the reader saw {line.wasRead ?? 'nothing'}
          </span>
        )}
      </span>
    </span>
  );
}
