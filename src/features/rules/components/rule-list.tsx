import { classLabel } from '../../../../server/contract/document-classes.ts';
import type { RuleView } from '../../../../server/contract/rule-tables.ts';
import { Badge } from '../../../components/ui/badge.tsx';
import { formatDay } from '../../../lib/format.ts';
import { sourceStatusWords } from '../../../lib/source-words.ts';

const basisWords: Record<RuleView['basis'], string> = {
  law: 'law: must be kept',
  guidance: 'guidance: advised to keep',
  practice: 'common practice: advised to keep',
};

/** Rules, each opening to its sentence, its source and its cautions. */
export function RuleList({ rules }: { rules: RuleView[] }) {
  return (
    <ul className="divide-y divide-line rounded-lg border border-line bg-paper-raised">
      {rules.map((rule) => (
        <li key={rule.id}>
          <details className="group px-4 py-1">
            <summary className="flex min-h-11 cursor-pointer flex-wrap items-center gap-x-4 gap-y-1 py-2">
              <span className="min-w-0 flex-1 basis-72 font-semibold">{rule.sentence}</span>
              <span className="text-sm text-ink-soft">{basisWords[rule.basis]}</span>
              {rule.source.status === 'memory' ? (
                <Badge tone="soon">{sourceStatusWords.memory}</Badge>
              ) : null}
            </summary>
            <dl className="grid gap-x-6 gap-y-2 pb-4 text-sm sm:grid-cols-[10rem_1fr]">
              <dt className="text-ink-soft">Kinds of paper</dt>
              <dd>{rule.classes.map(classLabel).join(', ')}</dd>
              <dt className="text-ink-soft">Source</dt>
              <dd>
                {[rule.source.authority, rule.source.title, rule.source.section]
                  .filter(Boolean)
                  .join(', ')}{' '}
                ({sourceStatusWords[rule.source.status]}
                {rule.source.readOn ? `, ${formatDay(rule.source.readOn)}` : ''})
              </dd>
              <dt className="text-ink-soft">Original</dt>
              <dd>{originalWords[rule.original] ?? rule.original}</dd>
              {rule.cautions.length > 0 ? (
                <>
                  <dt className="text-ink-soft">Cautions</dt>
                  <dd>{rule.cautions.join(' ')}</dd>
                </>
              ) : null}
              {rule.note ? (
                <>
                  <dt className="text-ink-soft">Note</dt>
                  <dd>{rule.note}</dd>
                </>
              ) : null}
              <dt className="text-ink-soft">Rule</dt>
              <dd className="font-mono">{rule.id}</dd>
            </dl>
          </details>
        </li>
      ))}
    </ul>
  );
}

const originalWords: Record<string, string> = {
  required: 'needed: a scan is not enough',
  'scan-is-enough': 'a complete, legible scan is enough',
  conditional: 'needed in some cases, see the note and cautions',
};
