import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { defaultWaitDays, type ShredList } from '../../../../server/contract/shred-lists.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { GuidanceNote } from '../../../components/ui/guidance-note.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { applyFieldProblems } from '../../../lib/form-problems.ts';
import { formatCount } from '../../../lib/format.ts';
import { useApproveShredList } from '../api/approve-shred-list.ts';
import { consentFormSchema, countAmounts, listGoing, type ConsentForm } from '../logic/consent.ts';
import { listKeptBack } from '../logic/keep-back.ts';
import { describeConsent, describeRow } from '../logic/words.ts';
import { InstructionFields } from './instruction-fields.tsx';
import { RefusalBanner } from './refusal-banner.tsx';

interface ConsentDialogProps {
  /** The list as the person has seen it: consent binds to its version. */
  list: ShredList;
  keepBack: ReadonlySet<string>;
  /** Set when the practice records what the client said: the household's day. */
  instructionToday: string | null;
  onAgreed: () => void;
  onClose: () => void;
}

const waits = [
  { days: 0, words: 'No wait' },
  { days: 3, words: '3 days' },
  { days: defaultWaitDays, words: `${defaultWaitDays} days, the usual` },
  { days: 14, words: '14 days' },
  { days: 30, words: '30 days' },
];

/** The plain sentence that is agreed to, what stays, and how long nothing happens yet. */
export function ConsentDialog({
  list,
  keepBack,
  instructionToday,
  onAgreed,
  onClose,
}: ConsentDialogProps) {
  const approve = useApproveShredList(list);
  const going = countAmounts(listGoing(list.rows, keepBack));
  const staying = listKeptBack(list.rows, keepBack);
  const { register, handleSubmit, formState, setError } = useForm<ConsentForm>({
    resolver: zodResolver(consentFormSchema),
    defaultValues: {
      waitDays: defaultWaitDays,
      ...(instructionToday
        ? { instruction: { how: 'in-person', on: instructionToday, words: '' } }
        : {}),
    },
  });
  const submit = handleSubmit((form) =>
    approve.mutate(
      { ...form, version: list.version, keepBack: staying.map((row) => row.paper) },
      { onSuccess: onAgreed, onError: (error) => applyFieldProblems(error, setError) },
    ),
  );
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title={instructionToday ? 'Record the client’s instruction' : 'Agree to the shredding'}
    >
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-5">
        {approve.error ? <RefusalBanner error={approve.error} title="Not agreed" /> : null}
        <blockquote className="border-l-4 border-teal bg-teal-wash px-4 py-3">
          {describeConsent(going.papers, going.sheets)}
        </blockquote>
        {staying.length > 0 ? (
          <div>
            <p className="font-semibold">
              Kept back: {formatCount(staying.length, 'paper')}, filed in the household
            </p>
            <ul className="mt-1 list-disc pl-5 text-sm text-ink-soft">
              {staying.map((row) => (
                <li key={row.paper}>
                  Paper {row.paperNumber}: {describeRow(row)}
                </li>
              ))}
            </ul>
          </div>
        ) : null}
        {instructionToday ? (
          <InstructionFields
            register={register}
            errors={formState.errors.instruction}
            today={instructionToday}
          />
        ) : null}
        <Field
          label="Wait before shredding"
          hint="Until then nothing is shredded, unless the client is there. Time for second thoughts."
          error={formState.errors.waitDays?.message}
        >
          {(props) => (
            <Select
              {...props}
              className="max-w-56"
              {...register('waitDays', { valueAsNumber: true })}
            >
              {waits.map(({ days, words }) => (
                <option key={days} value={days}>
                  {words}
                </option>
              ))}
            </Select>
          )}
        </Field>
        <GuidanceNote />
        <div className="flex flex-wrap justify-end gap-3">
          <Button onClick={onClose}>Not yet</Button>
          <Button type="submit" tone="primary" busy={approve.isPending}>
            {instructionToday ? 'Record the agreement' : 'I agree'}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
