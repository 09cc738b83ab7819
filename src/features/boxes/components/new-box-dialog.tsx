import { useState } from 'react';
import { useForm } from 'react-hook-form';
import type { BoxRecord } from '../../../../server/contract/boxes.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { type NewBox, useCreateBox } from '../api/create-box.ts';
import { useAreas } from '../api/list-areas.ts';

const anotherArea = 'another';

/** Adds a box: a few words and where it stands. Its code comes by itself. */
export function NewBoxDialog({
  householdId,
  onCreated,
  onClose,
}: {
  householdId: string;
  onCreated: (box: BoxRecord) => void;
  onClose: () => void;
}) {
  const areas = useAreas(householdId);
  const create = useCreateBox(householdId);
  const [area, setArea] = useState('');
  const { register, handleSubmit } = useForm<NewBox>({
    defaultValues: { label: '', areaId: null, newArea: '' },
  });
  const submit = handleSubmit(({ label, newArea }) =>
    create.mutate(
      {
        label: label.trim(),
        areaId: area === '' || area === anotherArea ? null : area,
        newArea: area === anotherArea ? newArea.trim() : '',
      },
      { onSuccess: onCreated },
    ),
  );
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Add a box"
      description="Anything that holds a pile: a box, a drawer, a bag. It gets a code for its label."
    >
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-4">
        {create.error ? (
          <Banner alert tone="fault" title="Not added">
            {sentenceOf(create.error)}
          </Banner>
        ) : null}
        <Field label="What it is" hint="For example “Shoe box from the wardrobe”.">
          {(props) => (
            <TextInput {...props} {...register('label')} maxLength={120} autoComplete="off" />
          )}
        </Field>
        <Field label="Where it comes from">
          {(props) => (
            <Select {...props} value={area} onChange={(event) => setArea(event.target.value)}>
              <option value="">Not said</option>
              {areas.data?.items.map((item) => (
                <option key={item.id} value={item.id}>
                  {item.name}
                </option>
              ))}
              <option value={anotherArea}>Another place …</option>
            </Select>
          )}
        </Field>
        {area === anotherArea ? (
          <Field label="Name of the place">
            {(props) => (
              <TextInput {...props} {...register('newArea')} maxLength={80} autoComplete="off" />
            )}
          </Field>
        ) : null}
        <div className="flex justify-end gap-3 pt-2">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" tone="primary" busy={create.isPending}>
            Add the box
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
