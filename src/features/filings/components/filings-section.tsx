import { useState } from 'react';
import type { z } from 'zod';
import { toast } from 'sonner';
import type { Filing, putFilingSchema } from '../../../../server/contract/households.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { QueryView } from '../../../components/ui/query-view.tsx';
import { Section } from '../../../components/ui/section.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { formatCount, formatCountry, formatDay } from '../../../lib/format.ts';
import { useFilings } from '../api/list-filings.ts';
import { usePutFiling } from '../api/put-filing.ts';

type Answer = z.infer<typeof putFilingSchema>['answer'];

const answerWords: Record<Answer, string> = {
  'on-time': 'on time',
  'on-day': 'on a day',
  never: 'never',
  unknown: 'not known',
};

function describeAnswer(filing: Filing): string {
  if (filing.answer === 'on-day' && filing.filedOn) return `sent on ${formatDay(filing.filedOn)}`;
  return filing.answer === 'on-time' ? 'sent on time' : answerWords[filing.answer];
}

/** "When was the return sent?": one answer settles all papers of a tax year. */
export function FilingsSection({
  householdId,
  mayAnswer,
}: {
  householdId: string;
  mayAnswer: boolean;
}) {
  const filings = useFilings(householdId);
  return (
    <Section
      id="returns"
      title="Tax returns sent"
      intro="The time of many papers counts from the day a return was sent. One answer settles all papers of that year."
    >
      <QueryView query={filings} what="the returns">
        {({ items, questions }) => (
          <>
            {mayAnswer
              ? questions.map((question) => (
                  <FilingQuestion
                    key={`${question.country} ${question.taxYear}`}
                    householdId={householdId}
                    question={question}
                  />
                ))
              : null}
            {items.length > 0 ? (
              <ul className="divide-y divide-line border-y border-line">
                {items.map((filing) => (
                  <li key={filing.id} className="flex flex-wrap gap-x-6 py-2.5">
                    <span className="min-w-48 font-semibold">
                      {filing.taxYear}, {formatCountry(filing.country)}
                      {filing.person ? `, ${filing.person}` : ''}
                    </span>
                    <span className="text-ink-soft">{describeAnswer(filing)}</span>
                  </li>
                ))}
              </ul>
            ) : questions.length === 0 ? (
              <p className="text-ink-soft">No paper waits for a return.</p>
            ) : null}
          </>
        )}
      </QueryView>
    </Section>
  );
}

function FilingQuestion({
  householdId,
  question,
}: {
  householdId: string;
  question: { country: string; taxYear: string; papers: number };
}) {
  const put = usePutFiling(householdId);
  const [answer, setAnswer] = useState<Answer>('on-time');
  const [filedOn, setFiledOn] = useState('');
  const send = () =>
    put.mutate(
      {
        country: question.country,
        taxYear: question.taxYear,
        answer,
        filedOn: answer === 'on-day' ? filedOn || null : null,
      },
      {
        onSuccess: () =>
          toast.success(`Noted. Papers of ${question.taxYear} were worked out anew.`),
      },
    );
  return (
    <div className="mb-4 rounded-lg border border-line bg-paper-raised p-4">
      <p className="font-semibold">
        When was the return for {question.taxYear} ({formatCountry(question.country)}) sent?
      </p>
      <p className="text-sm text-ink-soft">
        {formatCount(question.papers, 'paper')} {question.papers === 1 ? 'waits' : 'wait'} for this.
      </p>
      {put.error ? (
        <Banner alert tone="fault" className="mt-3" title="Not noted">
          {sentenceOf(put.error)}
        </Banner>
      ) : null}
      <div className="mt-3 flex flex-wrap items-end gap-3">
        <Field label="It was sent" className="w-44">
          {(props) => (
            <Select
              {...props}
              value={answer}
              onChange={(event) => setAnswer(event.target.value as Answer)}
            >
              {Object.entries(answerWords).map(([value, words]) => (
                <option key={value} value={value}>
                  {words}
                </option>
              ))}
            </Select>
          )}
        </Field>
        {answer === 'on-day' ? (
          <Field label="Day" className="w-48">
            {(props) => (
              <DateInput
                {...props}
                value={filedOn}
                onChange={(event) => setFiledOn(event.target.value)}
              />
            )}
          </Field>
        ) : null}
        <Button tone="primary" busy={put.isPending} onClick={send}>
          Answer
        </Button>
      </div>
    </div>
  );
}
