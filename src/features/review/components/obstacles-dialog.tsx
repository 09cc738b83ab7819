import { pileLabels, type Pile } from '../../../../server/contract/papers.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { KeyHint } from '../../../components/ui/key-hint.tsx';
import { takeFocus } from '../logic/take-focus.ts';

interface ObstaclesDialogProps {
  pile: Pile;
  sentences: string[];
  onKeep: () => void;
  onPutThere: () => void;
  onClose: () => void;
}

/** The paper may not leave yet: why, and what can be done with it meanwhile. */
export function ObstaclesDialog({
  pile,
  sentences,
  onKeep,
  onPutThere,
  onClose,
}: ObstaclesDialogProps) {
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="It cannot leave yet"
      footer={
        <>
          <Button onClick={onPutThere}>Let it wait on “{pileLabels[pile]}”</Button>
          <Button ref={takeFocus} tone="primary" onClick={onKeep}>
            Keep it for now <KeyHint keys="Enter" />
          </Button>
        </>
      }
    >
      <ul className="list-disc space-y-1 pl-5">
        {sentences.map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
      <p className="mt-3 text-ink-soft">
        On the pile it only waits: nothing leaves before every one of these is settled.
      </p>
    </Dialog>
  );
}
