import { useState } from 'react';
import { toast } from 'sonner';
import type { Household } from '../../../../server/contract/households.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { QueryView } from '../../../components/ui/query-view.tsx';
import { Section } from '../../../components/ui/section.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { formatCount, formatCountry } from '../../../lib/format.ts';
import { useFilings } from '../api/list-filings.ts';
import { describeFiling } from '../logic/answer-words.ts';
import { FilingAnswer } from './filing-answer.tsx';
import type { Filing } from '../../../../server/contract/households.ts';

interface Asked {
  country: string;
  taxYear: string;
  filing?: Filing;
}

interface FilingSectionProps {
  household: Household;
  mayAnswer: boolean;
}

/** Tax returns sent: the questions whose answers settle most papers first, then what was answered. */
export function FilingSection({ household, mayAnswer }: FilingSectionProps) {
  const filings = useFilings(household.id);
  const [asked, setAsked] = useState<Asked | null>(null);
  const [otherYear, setOtherYear] = useState('');
  const people = household.people.map((person) => person.name);
  const line =
    'flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border-t border-line py-3';
  return (
    <Section
      id="returns"
      title="Tax returns sent"
      intro="The clock of tax papers starts when the return was sent. One answer settles all papers of that year."
    >
      <QueryView query={filings} what="the tax returns">
        {({ items, questions }) => (
          <>
            <ul>
              {questions.map((question) => (
                <li key={`${question.country}${question.taxYear}`} className={line}>
                  <p>
                    <span className="font-semibold">
                      {question.taxYear}, {formatCountry(question.country)}
                    </span>
                    <span className="text-ink-soft">
                      {' '}
                      · the answer settles {formatCount(question.papers, 'paper')}
                    </span>
                  </p>
                  {mayAnswer ? (
                    <Button tone="primary" size="small" onClick={() => setAsked(question)}>
                      When was it sent?
                    </Button>
                  ) : null}
                </li>
              ))}
              {items.map((filing) => (
                <li key={filing.id} className={line}>
                  <p>
                    <span className="font-semibold">
                      {filing.taxYear}, {formatCountry(filing.country)}
                    </span>
                    <span className="text-ink-soft">
                      {' '}
                      · {filing.person ?? 'everybody'} · {describeFiling(filing)}
                    </span>
                  </p>
                  {mayAnswer ? (
                    <Button
                      size="small"
                      onClick={() =>
                        setAsked({ country: filing.country, taxYear: filing.taxYear, filing })
                      }
                    >
                      Change
                    </Button>
                  ) : null}
                </li>
              ))}
            </ul>
            {items.length + questions.length === 0 ? (
              <p className="border-t border-line py-3 text-ink-soft">
                No paper waits for an answer about a return.
              </p>
            ) : null}
          </>
        )}
      </QueryView>
      {mayAnswer ? (
        <div className="mt-2 flex flex-wrap items-end gap-3 border-t border-line pt-4">
          <Field label="Another tax year" hint="For example 2024-25, or 2024.">
            {(props) => (
              <TextInput
                {...props}
                value={otherYear}
                onChange={(event) => setOtherYear(event.target.value.trim())}
                className="max-w-48"
              />
            )}
          </Field>
          <Button
            disabled={!/^\d{4}(-\d{2})?$/.test(otherYear)}
            onClick={() => setAsked({ country: household.country, taxYear: otherYear })}
          >
            Answer for it
          </Button>
        </div>
      ) : null}
      <Dialog
        open={asked !== null}
        onOpenChange={(open) => {
          if (!open) setAsked(null);
        }}
        width="wide"
        title={asked ? `The return for ${asked.taxYear}` : ''}
        description={asked ? formatCountry(asked.country) : undefined}
      >
        {asked ? (
          <FilingAnswer
            key={`${asked.country}${asked.taxYear}${asked.filing?.id ?? ''}`}
            householdId={household.id}
            people={people}
            {...asked}
            onSaved={() => {
              setAsked(null);
              setOtherYear('');
              toast.success('Saved. The papers of that year are being assessed anew.');
            }}
          />
        ) : null}
      </Dialog>
    </Section>
  );
}
