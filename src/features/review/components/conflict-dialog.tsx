import { useState } from 'react';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import type { Paper, UpdatePaper } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Radio } from '../../../components/ui/checkbox.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { formatDay } from '../../../lib/format.ts';
import { describeValue, dropFields, listDifferences } from '../logic/conflict.ts';
import type { OutboxEntry } from '../logic/outbox.ts';

interface ConflictDialogProps {
  entry: OutboxEntry;
  current: Paper;
  /** With null nothing of mine is left to send. */
  onSettle: (patch: UpdatePaper | null) => void;
  onClose: () => void;
}

/** Somebody else changed the paper first: both values side by side, and the person chooses. */
export function ConflictDialog({ entry, current, onSettle, onClose }: ConflictDialogProps) {
  const [theirs, setTheirs] = useState<ReadonlySet<string>>(new Set());
  const differences = listDifferences(entry.patch, entry.base, current);
  const mine = differences.filter((difference) => difference.mine !== undefined);
  const others = differences.filter((difference) => difference.mine === undefined);
  const choose = (key: string, isTheirs: boolean) => {
    const next = new Set(theirs);
    if (isTheirs) next.add(key);
    else next.delete(key);
    setTheirs(next);
  };
  const save = () => {
    const dropped = new Set(theirs);
    if (dropped.has('pile')) dropped.add('status');
    const patch = dropFields(entry.patch, dropped);
    onSettle(Object.keys(patch).length > 0 ? patch : null);
  };
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Somebody else changed this paper too"
      description={`${classLabel(current.class)}, no. ${current.number}. Nothing of yours is lost: choose for each line.`}
      footer={
        <>
          <Button onClick={() => onSettle(null)}>Leave all of theirs</Button>
          <Button tone="primary" onClick={save}>
            Save this choice
          </Button>
        </>
      }
    >
      <div className="space-y-4">
        {mine.map((difference) => (
          <fieldset key={difference.key} className="rounded-md border border-line p-3">
            <legend className="px-1 font-semibold">{difference.label}</legend>
            <div className="grid gap-x-4 sm:grid-cols-2">
              <Radio
                name={difference.key}
                checked={!theirs.has(difference.key)}
                onChange={() => choose(difference.key, false)}
                label={
                  <Value
                    who="Yours"
                    text={describeValue(difference.key, difference.mine ?? null, formatDay)}
                  />
                }
              />
              <Radio
                name={difference.key}
                checked={theirs.has(difference.key)}
                onChange={() => choose(difference.key, true)}
                label={
                  <Value
                    who="Theirs"
                    text={describeValue(difference.key, difference.theirs, formatDay)}
                  />
                }
              />
            </div>
          </fieldset>
        ))}
        {others.length > 0 && (
          <div className="text-sm">
            <p className="font-semibold">They also changed</p>
            <ul className="list-disc pl-5">
              {others.map((difference) => (
                <li key={difference.key}>
                  {difference.label}: {describeValue(difference.key, difference.theirs, formatDay)}
                </li>
              ))}
            </ul>
          </div>
        )}
      </div>
    </Dialog>
  );
}

function Value({ who, text }: { who: string; text: string }) {
  return (
    <>
      <span className="block text-sm text-ink-soft">{who}</span>
      <span className="block break-words whitespace-pre-line">{text}</span>
    </>
  );
}
