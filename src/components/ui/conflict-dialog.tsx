import { Button } from './button.tsx';
import { Dialog } from './dialog.tsx';

interface ConflictDialogProps {
  open: boolean;
  /** Closes without sending anything; what was typed stays in the form. */
  onClose: () => void;
  /** What both people changed, in words. Empty when their changes touch different things. */
  rows: readonly { name: string; mine: string; theirs: string }[];
  busy: boolean;
  onKeepMine: () => void;
  onTakeTheirs: () => void;
}

/** Somebody else saved in the meantime: both versions side by side, nothing is thrown away unasked. */
export function ConflictDialog({
  open,
  onClose,
  rows,
  busy,
  onKeepMine,
  onTakeTheirs,
}: ConflictDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={(isOpen) => {
        if (!isOpen) onClose();
      }}
      width="wide"
      title="Somebody else saved this in the meantime"
      description={
        rows.length > 0
          ? 'You both changed the same thing. Choose which to keep; your other changes are kept either way.'
          : 'You changed different things, so both can be kept.'
      }
      footer={
        rows.length > 0 ? (
          <>
            <Button onClick={onTakeTheirs} busy={busy}>
              Take theirs
            </Button>
            <Button tone="primary" onClick={onKeepMine} busy={busy}>
              Keep mine
            </Button>
          </>
        ) : (
          <Button tone="primary" onClick={onKeepMine} busy={busy}>
            Save both
          </Button>
        )
      }
    >
      {rows.map((row) => (
        <section key={row.name} className="border-t border-line py-3">
          <h3 className="font-semibold">{row.name}</h3>
          <dl className="mt-2 grid gap-3 sm:grid-cols-2">
            <div className="rounded-md bg-teal-wash p-3">
              <dt className="text-sm font-semibold text-teal-strong">Yours</dt>
              <dd className="whitespace-pre-line">{row.mine}</dd>
            </div>
            <div className="rounded-md bg-paper-sunk p-3">
              <dt className="text-sm font-semibold text-ink-soft">Theirs</dt>
              <dd className="whitespace-pre-line">{row.theirs}</dd>
            </div>
          </dl>
        </section>
      ))}
    </Dialog>
  );
}
