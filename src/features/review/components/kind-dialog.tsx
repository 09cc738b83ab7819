import type { ClassId } from '../../../../server/contract/document-classes.ts';
import type { Paper } from '../../../../server/contract/papers.ts';
import { ClassPicker } from '../../../components/ui/class-picker.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';

interface KindDialogProps {
  paper: Paper;
  onChoose: (kind: ClassId) => void;
  onClose: () => void;
}

/** Chooses another kind of paper; the reader's other guesses come first. */
export function KindDialog({ paper, onChoose, onClose }: KindDialogProps) {
  return (
    <Dialog open onOpenChange={onClose} title="What kind of paper is it?">
      <ClassPicker
        value={paper.class}
        suggested={paper.candidates.map(({ class: kind }) => kind)}
        alwaysOpen
        takeFocus
        onChange={onChoose}
      />
    </Dialog>
  );
}
