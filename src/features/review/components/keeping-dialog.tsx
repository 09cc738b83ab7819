import { useState, type FormEvent } from 'react';
import type { Paper, UpdatePaper } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Radio } from '../../../components/ui/checkbox.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { takeFocus } from '../logic/take-focus.ts';
import { keptBecauseHints, keptBecauseLabels } from '../logic/words.ts';

type KeptBecause = keyof typeof keptBecauseLabels;
const reasons = Object.keys(keptBecauseLabels) as KeptBecause[];

interface KeepingDialogProps {
  paper: Paper;
  /** Where the person starts. */
  startAt: 'why' | 'place';
  /** Places used before, most recent first. */
  knownPlaces: readonly string[];
  onSave: (patch: UpdatePaper) => void;
  onClose: () => void;
}

/** Says where a paper is kept and why; it can be kept in the same stroke. */
export function KeepingDialog({
  paper,
  startAt,
  knownPlaces,
  onSave,
  onClose,
}: KeepingDialogProps) {
  const [because, setBecause] = useState<KeptBecause | null>(paper.keptBecause);
  const [place, setPlace] = useState(paper.place ?? '');
  const values: UpdatePaper = { keptBecause: because, place: place.trim() || null };
  const isKept = paper.status === 'kept';
  const submit = (event: FormEvent) => {
    event.preventDefault();
    onSave(isKept ? values : { ...values, pile: 'file-here' });
  };
  return (
    <Dialog open onOpenChange={onClose} title="Keep it: why and where">
      <form onSubmit={submit} className="space-y-5">
        <fieldset>
          <legend className="mb-1 font-semibold">Kept because</legend>
          {reasons.map((reason) => (
            <Radio
              key={reason}
              ref={startAt === 'why' && reason === (because ?? 'duty') ? takeFocus : undefined}
              name="kept-because"
              checked={because === reason}
              onChange={() => setBecause(reason)}
              label={
                <>
                  <span className="font-semibold">{keptBecauseLabels[reason]}</span>
                  <span className="text-ink-soft">: {keptBecauseHints[reason]}</span>
                </>
              }
            />
          ))}
          <Radio
            name="kept-because"
            checked={because === null}
            onChange={() => setBecause(null)}
            label="Not said"
          />
        </fieldset>
        <Field label="Place" hint="Drawer, folder or shelf: where anybody would find it again.">
          {(control) => (
            <>
              <TextInput
                {...control}
                ref={startAt === 'place' ? takeFocus : undefined}
                value={place}
                maxLength={200}
                list="known-places"
                onChange={(event) => setPlace(event.currentTarget.value)}
              />
              <datalist id="known-places">
                {knownPlaces.map((known) => (
                  <option key={known} value={known} />
                ))}
              </datalist>
            </>
          )}
        </Field>
        <div className="flex flex-wrap justify-end gap-3">
          {!isKept && <Button onClick={() => onSave(values)}>Save, decide later</Button>}
          <Button tone="primary" type="submit">
            {isKept ? 'Save' : 'Keep it here'}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
