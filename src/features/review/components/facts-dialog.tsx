import { useForm } from 'react-hook-form';
import type { Paper, UpdatePaper } from '../../../../server/contract/papers.ts';
import { dateRoles } from '../../../../server/contract/readings.ts';
import { Button } from '../../../components/ui/button.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { formatDay } from '../../../lib/format.ts';
import { buildFactsPatch, fillFactsForm, type FactsForm } from '../logic/facts-form.ts';
import { dateRoleLabels } from '../logic/words.ts';

interface FactsDialogProps {
  paper: Paper;
  onSave: (facts: NonNullable<UpdatePaper['facts']>) => void;
  onClose: () => void;
}

type FieldName =
  'taxYear' | 'issuer' | 'reference' | 'addressee' | `dates.${keyof FactsForm['dates']}`;

/** Corrects what was read. An emptied field says that the paper shows none. */
export function FactsDialog({ paper, onSave, onClose }: FactsDialogProps) {
  const before = fillFactsForm(paper.facts);
  const form = useForm<FactsForm>({ defaultValues: before });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) => {
    const { patch, faults } = buildFactsPatch(before, values);
    for (const fault of faults) {
      form.setError(fault.field as FieldName, { message: fault.message }, { shouldFocus: true });
    }
    if (faults.length > 0) return;
    if (patch) onSave(patch);
    else onClose();
  });
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="What does it say?"
      description="Empty a field when the paper does not show it."
      width="wide"
    >
      <form onSubmit={(event) => void submit(event)} noValidate className="space-y-5">
        <div className="grid gap-4 sm:grid-cols-3">
          {dateRoles.map((role) => (
            <Field
              key={role}
              label={dateRoleLabels[role]}
              hint={hintOf(paper.read?.facts.dates[role]?.value, paper.facts.dates[role]?.value)}
              error={errors.dates?.[role]?.message}
            >
              {(control) => <DateInput {...control} {...form.register(`dates.${role}`)} />}
            </Field>
          ))}
        </div>
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label="From" error={errors.issuer?.message}>
            {(control) => <TextInput {...control} maxLength={200} {...form.register('issuer')} />}
          </Field>
          <Field label="To" error={errors.addressee?.message}>
            {(control) => (
              <TextInput {...control} maxLength={200} {...form.register('addressee')} />
            )}
          </Field>
          <Field label="Reference" error={errors.reference?.message}>
            {(control) => (
              <TextInput {...control} maxLength={200} {...form.register('reference')} />
            )}
          </Field>
          <Field
            label="Tax year"
            hint="As 2024-25 where it runs over two years, else 2024."
            error={errors.taxYear?.message}
          >
            {(control) => <TextInput {...control} maxLength={9} {...form.register('taxYear')} />}
          </Field>
        </div>
        <div className="flex justify-end">
          <Button tone="primary" type="submit">
            Save
          </Button>
        </div>
      </form>
    </Dialog>
  );
}

/** What the reader saw, where somebody has corrected it. */
function hintOf(read: string | undefined, now: string | undefined): string | undefined {
  return read && read !== now ? `The reader saw ${formatDay(read)}.` : undefined;
}
