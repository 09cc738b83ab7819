import { useState } from 'react';
import type { SubmitEvent } from 'react';
import type { Filing } from '../../../../server/contract/households.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { fieldProblemsOf, sentenceOf } from '../../../lib/api-error.ts';
import { usePutFiling } from '../api/put-filing.ts';
import { answerWords } from '../logic/answer-words.ts';

interface FilingAnswerProps {
  householdId: string;
  country: string;
  taxYear: string;
  /** Names to choose from; nobody chosen means the whole household. */
  people: readonly string[];
  filing?: Filing;
  onSaved: () => void;
}

/** "When was the return sent?" for one tax year. */
export function FilingAnswer({
  householdId,
  country,
  taxYear,
  people,
  filing,
  onSaved,
}: FilingAnswerProps) {
  const put = usePutFiling(householdId);
  const [answer, setAnswer] = useState<Filing['answer']>(filing?.answer ?? 'on-time');
  const [filedOn, setFiledOn] = useState(filing?.filedOn ?? '');
  const [person, setPerson] = useState(filing?.person ?? '');
  const faults = fieldProblemsOf(put.error);
  const submit = (event: SubmitEvent<HTMLFormElement>): void => {
    event.preventDefault();
    put.mutate(
      {
        country,
        taxYear,
        answer,
        person: person || null,
        filedOn: answer === 'on-day' ? filedOn || null : null,
      },
      { onSuccess: onSaved },
    );
  };
  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label={`The return for ${taxYear} was sent`}>
          {(props) => (
            <Select
              {...props}
              value={answer}
              onChange={(event) => setAnswer(event.target.value as Filing['answer'])}
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
          <Field label="Sent on" error={faults.find((f) => f.field === 'filedOn')?.message}>
            {(props) => (
              <DateInput
                {...props}
                value={filedOn}
                onChange={(event) => setFiledOn(event.target.value)}
              />
            )}
          </Field>
        ) : null}
        {people.length > 1 ? (
          <Field label="Whose return">
            {(props) => (
              <Select
                {...props}
                value={person}
                disabled={filing !== undefined}
                onChange={(event) => setPerson(event.target.value)}
              >
                <option value="">Everybody’s</option>
                {people.map((name) => (
                  <option key={name} value={name}>
                    {name}
                  </option>
                ))}
              </Select>
            )}
          </Field>
        ) : null}
      </div>
      {put.error && !faults.some((f) => f.field === 'filedOn') ? (
        <Banner alert tone="danger" title="Not saved">
          {sentenceOf(put.error)}
        </Banner>
      ) : null}
      <div>
        <Button type="submit" tone="primary" busy={put.isPending}>
          Save the answer
        </Button>
      </div>
    </form>
  );
}
