import { useState } from 'react';
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import { destructionSchema, type ShredList } from '../../../../server/contract/shred-lists.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { applyFieldProblems } from '../../../lib/form-problems.ts';
import { formatCount, formatDay } from '../../../lib/format.ts';
import { useRecordDestruction } from '../api/record-destruction.ts';
import { decideReadiness } from '../logic/consent.ts';
import {
  destructionFormSchema,
  type DestructionForm,
  type DestructionRecord,
} from '../logic/destruction-form.ts';
import { buildOutcomeRows, countOutcomes, type Outcomes } from '../logic/outcomes.ts';
import { DestructionFields } from './destruction-fields.tsx';
import { RefusalBanner } from './refusal-banner.tsx';

interface DestructionDialogProps {
  list: ShredList;
  today: string;
  outcomes: Outcomes;
  onRecorded: () => void;
  onClose: () => void;
}

/** When, where, how and before whose eyes; then asks once more, for this cannot be undone. */
export function DestructionDialog({
  list,
  today,
  outcomes,
  onRecorded,
  onClose,
}: DestructionDialogProps) {
  const recording = useRecordDestruction(list);
  const [confirming, setConfirming] = useState<DestructionRecord | null>(null);
  const form = useForm<DestructionForm, unknown, DestructionRecord>({
    resolver: zodResolver(destructionFormSchema),
    defaultValues: {
      on: today,
      place: '',
      method: '',
      level: list.securityLevel,
      witness: '',
      clientPresent: false,
    },
  });
  const [on, clientPresent] = useWatch({ control: form.control, name: ['on', 'clientPresent'] });
  const readiness = decideReadiness(list.approval, on, clientPresent);
  const counts = countOutcomes(list.rows, outcomes);
  const ask = form.handleSubmit((record) => setConfirming(record));
  const send = (record: DestructionRecord) =>
    recording.mutate(
      destructionSchema.parse({ ...record, rows: buildOutcomeRows(list.rows, outcomes) }),
      {
        onSuccess: onRecorded,
        onError: (error) => {
          setConfirming(null);
          applyFieldProblems(error, form.setError);
        },
      },
    );
  if (confirming) {
    return (
      <Dialog
        open
        onOpenChange={() => setConfirming(null)}
        title={`${formatCount(counts.destroyed, 'paper')} shredded?`}
        description={`On ${formatDay(confirming.on)}, ${confirming.place}, ${confirming.method}. ${confirming.witness} watched.`}
        footer={
          <>
            <Button onClick={() => setConfirming(null)}>Back</Button>
            <Button tone="danger" busy={recording.isPending} onClick={() => send(confirming)}>
              Yes, record it
            </Button>
          </>
        }
      >
        <p>
          {counts['kept-back'] > 0
            ? `${formatCount(counts['kept-back'], 'paper')} kept back stay in the household. `
            : ''}
          {counts['not-found'] > 0
            ? `${formatCount(counts['not-found'], 'paper')} not found will be looked for. `
            : ''}
          This record cannot be taken back.
        </p>
      </Dialog>
    );
  }
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Record what was shredded"
      description="After the shredding, not before. The record is what proves later where the papers went."
    >
      <form noValidate onSubmit={(event) => void ask(event)} className="space-y-5">
        {recording.error ? <RefusalBanner error={recording.error} title="Not recorded" /> : null}
        <DestructionFields form={form} list={list} today={today} />
        {readiness.kind === 'waiting' ? (
          <Banner tone="soon" title={`Agreed from ${formatDay(readiness.notBefore)}`}>
            Before that day the client has to be there. If they were, tick it above.
          </Banner>
        ) : null}
        {readiness.kind === 'lapsed' ? (
          <Banner tone="soon" title={`The agreement held until ${formatDay(readiness.lapsedOn)}`}>
            Give this list up, gather a new one and ask again.
          </Banner>
        ) : null}
        <div className="flex flex-wrap justify-end gap-3">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" tone="primary" disabled={readiness.kind !== 'ready'}>
            Check once more
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
