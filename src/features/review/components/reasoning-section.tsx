import type { Paper } from '../../../../server/contract/papers.ts';
import { GuidanceNote } from '../../../components/ui/guidance-note.tsx';
import { formatDay, formatShortDay } from '../../../lib/format.ts';
import { sourceStatusWords } from '../../../lib/source-words.ts';
import { basisWords } from '../logic/words.ts';

/** How the date was worked out, step by step, the rules it rests on, and what was assumed. */
export function ReasoningSection({ paper }: { paper: Paper }) {
  const { steps, rules, assumed, cautions } = paper.assessment;
  return (
    <>
      {cautions.length > 0 && (
        <section aria-label="Take care" className="text-sm">
          <h2 className="font-semibold">Take care</h2>
          <ul className="list-disc space-y-1 pl-5">
            {cautions.map((caution) => (
              <li key={caution}>{caution}</li>
            ))}
          </ul>
        </section>
      )}
      <details open className="group text-sm">
        <summary className="flex min-h-11 cursor-pointer items-center font-semibold">
          How this was worked out
        </summary>
        {steps.length > 0 ? (
          <ol className="divide-y divide-line border-y border-line">
            {steps.map((step, index) => (
              <li key={index} className="flex justify-between gap-4 py-1.5">
                <span>{step.text}</span>
                <span className="shrink-0 text-right tabular-nums">
                  {step.date ? formatShortDay(step.date) : ''}
                </span>
              </li>
            ))}
          </ol>
        ) : (
          <p className="text-ink-soft">There is no sum for this paper.</p>
        )}
        {assumed.length > 0 && (
          <div className="mt-3">
            <h3 className="font-semibold">Assumed</h3>
            <ul className="list-disc space-y-1 pl-5 text-ink-soft">
              {assumed.map((sentence) => (
                <li key={sentence}>{sentence}</li>
              ))}
            </ul>
          </div>
        )}
        {rules.length > 0 && (
          <ul className="mt-3 space-y-3" aria-label="Rules">
            {rules.map((rule) => (
              <li key={rule.id}>
                <p>
                  <span className="font-semibold">{basisWords[rule.basis]}</span>
                  {rule.keepUntil && (
                    <span className="tabular-nums">, until {formatDay(rule.keepUntil)}</span>
                  )}
                </p>
                <p className="text-ink-soft">
                  {rule.source.authority}: {rule.source.title}
                  {rule.source.section && `, ${rule.source.section}`}{' '}
                  <span className={rule.source.status === 'read' ? '' : 'font-semibold text-ink'}>
                    ({sourceStatusWords[rule.source.status]})
                  </span>
                </p>
                <p className="text-xs break-all text-ink-faint">{rule.id}</p>
              </li>
            ))}
          </ul>
        )}
        <GuidanceNote className="mt-3 text-ink-soft" />
      </details>
    </>
  );
}
