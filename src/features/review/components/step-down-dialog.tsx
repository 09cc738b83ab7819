import { useState, type FormEvent } from 'react';
import type { Paper } from '../../../../server/contract/papers.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { GuidanceNote } from '../../../components/ui/guidance-note.tsx';
import { TextArea } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { formatDay } from '../../../lib/format.ts';
import { takeFocus } from '../logic/take-focus.ts';

interface StepDownDialogProps {
  paper: Paper;
  onStepDown: (reason: string) => Promise<void>;
  onClose: () => void;
}

const fewestLetters = 3;

/** Takes the rule's own date instead of the longer advised one, with a reason. */
export function StepDownDialog({ paper, onStepDown, onClose }: StepDownDialogProps) {
  const [reason, setReason] = useState('');
  const [fault, setFault] = useState<string>();
  const [failure, setFailure] = useState<string>();
  const [isBusy, setIsBusy] = useState(false);
  const { advisedUntil, advisedBecause, keepUntil } = paper.assessment;
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    if (reason.trim().length < fewestLetters) {
      setFault('Say why the shorter date is enough.');
      return;
    }
    setIsBusy(true);
    try {
      await onStepDown(reason.trim());
    } catch (error) {
      setFailure(sentenceOf(error));
      setIsBusy(false);
    }
  };
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Take the shorter time"
      description={
        <>
          {advisedUntil && `Better kept until ${formatDay(advisedUntil)}`}
          {advisedBecause && `: ${advisedBecause}`} The rule itself asks for{' '}
          {keepUntil ? formatDay(keepUntil) : 'no date'}.
        </>
      }
    >
      <form onSubmit={(event) => void submit(event)} noValidate className="space-y-4">
        {failure && <Banner tone="fault" alert title={failure} />}
        <Field label="Why the shorter time is enough" error={fault}>
          {(control) => (
            <TextArea
              {...control}
              ref={takeFocus}
              rows={2}
              maxLength={500}
              value={reason}
              onChange={(event) => {
                setReason(event.currentTarget.value);
                setFault(undefined);
              }}
            />
          )}
        </Field>
        <GuidanceNote />
        <div className="flex justify-end">
          <Button tone="primary" type="submit" busy={isBusy}>
            Take {keepUntil ? formatDay(keepUntil) : 'it'}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
