import { useState } from 'react';
import { Link } from 'react-router-dom';
import { classLabel } from '../../../server/contract/document-classes.ts';
import type { RuleView } from '../../../server/contract/rule-tables.ts';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Field } from '../../components/ui/field.tsx';
import { GuidanceNote } from '../../components/ui/guidance-note.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { Select } from '../../components/ui/select.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { TextInput } from '../../components/ui/text-input.tsx';
import { useRuleTable } from '../../features/rules/api/rule-tables.ts';
import { RuleList } from '../../features/rules/components/rule-list.tsx';
import { formatCount } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { sourceStatusWords } from '../../lib/source-words.ts';
import { useRouteId } from '../use-route-id.ts';

/** The rules of one country, and those common to all. */
export function Component() {
  const country = useRouteId('country');
  const table = useRuleTable(country);
  const [words, setWords] = useState('');
  const [status, setStatus] = useState('');
  return (
    <PageFrame>
      <PageHeading
        title={table.data ? `Rules: ${table.data.name}` : 'Rules'}
        above={
          <Link to={paths.rules()} className="underline hover:text-ink">
            How long papers are kept
          </Link>
        }
      />
      <search className="mb-4 flex flex-wrap items-end gap-3">
        <Field label="Kind of paper or word" className="w-full sm:w-72">
          {(props) => (
            <TextInput
              {...props}
              type="search"
              value={words}
              onChange={(event) => setWords(event.target.value)}
            />
          )}
        </Field>
        <Field label="Source" className="w-full sm:w-72">
          {(props) => (
            <Select {...props} value={status} onChange={(event) => setStatus(event.target.value)}>
              <option value="">All</option>
              {Object.entries(sourceStatusWords).map(([value, label]) => (
                <option key={value} value={value}>
                  {label}
                </option>
              ))}
            </Select>
          )}
        </Field>
      </search>
      <QueryView query={table} what="this rule table">
        {({ rules }) => {
          const found = rules.filter(
            (rule) => (!status || rule.source.status === status) && fits(rule, words),
          );
          return (
            <>
              <p aria-live="polite" className="mb-3 text-sm text-ink-soft">
                {formatCount(found.length, 'rule')}
              </p>
              {found.length > 0 ? (
                <RuleList rules={found} />
              ) : (
                <EmptyState title="No rule fits">Try fewer words.</EmptyState>
              )}
            </>
          );
        }}
      </QueryView>
      <GuidanceNote className="mt-8 text-sm text-ink-soft" />
    </PageFrame>
  );
}

function fits(rule: RuleView, words: string): boolean {
  const text = [
    rule.sentence,
    rule.id,
    rule.source.authority,
    rule.source.title,
    rule.source.section ?? '',
    ...rule.classes.map(classLabel),
  ]
    .join(' ')
    .toLowerCase();
  return words
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word));
}
