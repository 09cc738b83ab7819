import { useState } from 'react';
import type { SubmitEvent } from 'react';
import { Plus } from 'lucide-react';
import type { BoxRecord } from '../../../../server/contract/boxes.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { fieldProblemsOf, sentenceOf } from '../../../lib/api-error.ts';
import { useCreateArea } from '../api/create-area.ts';
import { useCreateBox } from '../api/create-box.ts';
import { useAreas } from '../api/list-areas.ts';

const anotherArea = 'another';

interface NewBoxFormProps {
  householdId: string;
  onCreated: (box: BoxRecord) => void;
}

/** Opens a box: what it is, and where in the house it was found. */
export function NewBoxForm({ householdId, onCreated }: NewBoxFormProps) {
  const areas = useAreas(householdId);
  const createArea = useCreateArea(householdId);
  const createBox = useCreateBox(householdId);
  const [label, setLabel] = useState('');
  const [areaId, setAreaId] = useState('');
  const [areaName, setAreaName] = useState('');
  const error = createBox.error ?? createArea.error;

  const open = async (): Promise<void> => {
    const area =
      areaId === anotherArea && areaName.trim()
        ? (await createArea.mutateAsync(areaName.trim())).id
        : areaId === anotherArea
          ? ''
          : areaId;
    // Kept, so that trying again does not make the area twice.
    setAreaId(area);
    onCreated(await createBox.mutateAsync({ label, areaId: area || null }));
  };
  const submit = (event: SubmitEvent<HTMLFormElement>): void => {
    event.preventDefault();
    // A failure is shown from the mutation's own state.
    open().catch(() => undefined);
  };
  return (
    <form noValidate onSubmit={submit} className="flex flex-col gap-4">
      <Field
        label="What is it?"
        hint="For example: bottom drawer, blue folder, carton by the door."
        error={fieldProblemsOf(createBox.error).find((f) => f.field === 'label')?.message}
      >
        {(props) => (
          <TextInput
            {...props}
            value={label}
            maxLength={120}
            autoComplete="off"
            onChange={(event) => setLabel(event.target.value)}
          />
        )}
      </Field>
      <Field label="Where was it?" optional>
        {(props) => (
          <Select {...props} value={areaId} onChange={(event) => setAreaId(event.target.value)}>
            <option value="">Not said</option>
            {areas.data?.items.map((area) => (
              <option key={area.id} value={area.id}>
                {area.name}
              </option>
            ))}
            <option value={anotherArea}>Another place…</option>
          </Select>
        )}
      </Field>
      {areaId === anotherArea ? (
        <Field label="Name of the place" hint="For example: study, kitchen, garage.">
          {(props) => (
            <TextInput
              {...props}
              value={areaName}
              maxLength={80}
              autoComplete="off"
              onChange={(event) => setAreaName(event.target.value)}
            />
          )}
        </Field>
      ) : null}
      {error ? (
        <Banner alert tone="danger" title="The box was not opened">
          {sentenceOf(error)}
        </Banner>
      ) : null}
      <div>
        <Button
          type="submit"
          tone="primary"
          icon={<Plus aria-hidden />}
          busy={createBox.isPending || createArea.isPending}
        >
          Open this box
        </Button>
      </div>
    </form>
  );
}
