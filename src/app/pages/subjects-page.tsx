import { useState } from 'react';
import { Plus, Tags } from 'lucide-react';
import { Link } from 'react-router-dom';
import { type Subject, subjectKindLabels } from '../../../server/contract/subjects.ts';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Button } from '../../components/ui/button.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { useSubjects } from '../../features/subjects/api/list-subjects.ts';
import { SubjectDialog } from '../../features/subjects/components/subject-dialog.tsx';
import { formatCount, formatDay } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { useMay } from '../../lib/use-may.ts';
import { useRouteId } from '../use-route-id.ts';

/** What papers are about: accounts, cars, policies; when one ends, the time of its papers starts. */
export function Component() {
  const householdId = useRouteId('householdId');
  const subjects = useSubjects(householdId);
  const mayWrite = useMay('subject:write', householdId);
  const [editing, setEditing] = useState<Subject | 'new' | null>(null);
  const add = mayWrite ? (
    <Button tone="primary" icon={<Plus aria-hidden />} onClick={() => setEditing('new')}>
      Add
    </Button>
  ) : null;
  return (
    <PageFrame>
      <PageHeading title="What papers are about" actions={subjects.data?.items.length ? add : null}>
        An account, a car, a policy, a job. Papers are linked to it on the review desk; when it
        ends, their time starts.
      </PageHeading>
      <QueryView query={subjects} what="what papers are about">
        {({ items }) =>
          items.length === 0 ? (
            <EmptyState icon={<Tags />} title="Nothing here yet" action={add}>
              Add the car or the account whose papers wait for its end.
            </EmptyState>
          ) : (
            <ul className="divide-y divide-line rounded-lg border border-line bg-paper-raised">
              {items.map((subject) => (
                <li
                  key={subject.id}
                  className="flex flex-wrap items-center gap-x-6 gap-y-1 px-4 py-3"
                >
                  <div className="min-w-0 flex-1 basis-60">
                    <p className="font-semibold">{subject.name}</p>
                    <p className="text-sm text-ink-soft">
                      {[subjectKindLabels[subject.kind], subject.reference, describeRun(subject)]
                        .filter(Boolean)
                        .join(' · ')}
                    </p>
                  </div>
                  <Link
                    className="inline-flex min-h-11 items-center underline"
                    to={paths.papers(householdId, { subject: subject.id })}
                  >
                    {formatCount(subject.papers, 'paper')}
                  </Link>
                  {mayWrite ? (
                    <Button
                      aria-label={`Change ${subject.name}`}
                      onClick={() => setEditing(subject)}
                    >
                      Change
                    </Button>
                  ) : null}
                </li>
              ))}
            </ul>
          )
        }
      </QueryView>
      {editing ? (
        <SubjectDialog
          householdId={householdId}
          subject={editing === 'new' ? null : editing}
          onClose={() => setEditing(null)}
        />
      ) : null}
    </PageFrame>
  );
}

function describeRun(subject: Subject): string {
  const from = subject.startedOn ? `from ${formatDay(subject.startedOn)}` : '';
  if (subject.endedOn) return `${from} ended on ${formatDay(subject.endedOn)}`.trim();
  return `${from} ${subject.endKnown ? 'still running' : 'end not known'}`.trim();
}
