import { useState, type FormEvent } from 'react';
import type { Paper, UpdatePaper } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextArea } from '../../../components/ui/text-input.tsx';
import { takeFocus } from '../logic/take-focus.ts';

interface NoteDialogProps {
  paper: Paper;
  /** People of the practice alone see and write the practice-only note. */
  isPractice: boolean;
  onSave: (patch: UpdatePaper) => void;
  onClose: () => void;
}

const mostLetters = 4000;

/** Writes the note that everybody in the household reads, and the one for the practice. */
export function NoteDialog({ paper, isPractice, onSave, onClose }: NoteDialogProps) {
  const [note, setNote] = useState(paper.note ?? '');
  const [practiceNote, setPracticeNote] = useState(paper.practiceNote ?? '');
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const patch: UpdatePaper = {};
    if (note.trim() !== (paper.note ?? '')) patch.note = note.trim() || null;
    if (isPractice && practiceNote.trim() !== (paper.practiceNote ?? '')) {
      patch.practiceNote = practiceNote.trim() || null;
    }
    onSave(patch);
  };
  return (
    <Dialog open onOpenChange={onClose} title="Note">
      <form onSubmit={submit} className="space-y-5">
        <Field label="Note" hint="Everybody who may see this paper reads it, the client too.">
          {(control) => (
            <TextArea
              {...control}
              ref={takeFocus}
              value={note}
              maxLength={mostLetters}
              onChange={(event) => setNote(event.currentTarget.value)}
            />
          )}
        </Field>
        {isPractice && (
          <Field
            label="For the practice only"
            hint="Not shown to the client, but part of the data they may ask for: write it so that they could read it."
          >
            {(control) => (
              <TextArea
                {...control}
                value={practiceNote}
                maxLength={mostLetters}
                onChange={(event) => setPracticeNote(event.currentTarget.value)}
              />
            )}
          </Field>
        )}
        <div className="flex justify-end">
          <Button tone="primary" type="submit">
            Save
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
