import { Link } from 'react-router-dom';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { GuidanceNote } from '../../components/ui/guidance-note.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { useRuleTables } from '../../features/rules/api/rule-tables.ts';
import { formatCount } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';

/** The countries whose rules are known. */
export function Component() {
  const tables = useRuleTables();
  return (
    <PageFrame width="reading">
      <PageHeading title="How long papers are kept">
        One table a country, with the source of every rule. Where a country or a kind of paper has
        no rule, the paper stays open: ask the adviser.
      </PageHeading>
      <QueryView query={tables} what="the rule tables">
        {({ items }) => (
          <ul className="divide-y divide-line rounded-lg border border-line bg-paper-raised">
            {items.map((table) => (
              <li key={table.country}>
                <Link
                  to={paths.rules(table.country)}
                  className="flex min-h-14 items-center justify-between gap-4 px-4 py-3 hover:bg-paper"
                >
                  <span className="font-semibold">{table.name}</span>
                  <span className="text-ink-soft">{formatCount(table.rules, 'rule')}</span>
                </Link>
              </li>
            ))}
          </ul>
        )}
      </QueryView>
      <GuidanceNote className="mt-8 text-sm text-ink-soft" />
    </PageFrame>
  );
}
