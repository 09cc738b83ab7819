import { Link } from 'react-router-dom';
import type { Paper, UpdatePaper } from '../../../../server/contract/papers.ts';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { paths } from '../../../lib/paths.ts';
import { useMay } from '../../../lib/use-may.ts';
import { useSubjectChoices } from '../api/list-subjects.ts';
import { asksForSubject, asksForTaxUse } from '../logic/questions.ts';

/** What only a person can tell the rules. An answer moves the dates at once. */
export function QuestionsSection({
  paper,
  onAmend,
}: {
  paper: Paper;
  onAmend: (patch: UpdatePaper) => void;
}) {
  const maySeeSubjects = useMay('subject:read', paper.householdId);
  const subjects = useSubjectChoices(paper.householdId, maySeeSubjects);
  const showsTaxUse = asksForTaxUse(paper);
  const showsSubject = maySeeSubjects && asksForSubject(paper);
  if (!showsTaxUse && !showsSubject) return null;
  const usedForTax = paper.answers.usedForTax;
  return (
    <section aria-label="What the rules need to know" className="space-y-3">
      <h2 className="font-semibold">What the rules need to know</h2>
      {showsTaxUse ? (
        <Field
          label="Was it used for a tax return?"
          hint="Not known counts as used, which keeps it longer."
        >
          {(props) => (
            <Select
              {...props}
              value={usedForTax === true ? 'yes' : usedForTax === false ? 'no' : ''}
              onChange={({ target }) => {
                if (target.value) onAmend({ answers: { usedForTax: target.value === 'yes' } });
              }}
            >
              <option value="">Not known</option>
              <option value="no">No</option>
              <option value="yes">Yes</option>
            </Select>
          )}
        </Field>
      ) : null}
      {showsSubject ? (
        <Field
          label="What is it about?"
          hint={
            <>
              When that ends, the paper’s time starts.{' '}
              <Link to={paths.subjects(paper.householdId)} className="underline">
                Add or end something
              </Link>
            </>
          }
        >
          {(props) => (
            <Select
              {...props}
              value={paper.subjectId ?? ''}
              onChange={({ target }) => onAmend({ subjectId: target.value || null })}
            >
              <option value="">Not said</option>
              {subjects.data?.items.map((subject) => (
                <option key={subject.id} value={subject.id}>
                  {subject.name}
                </option>
              ))}
            </Select>
          )}
        </Field>
      ) : null}
    </section>
  );
}
