import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { keyGroups } from '../logic/key-map.ts';

interface HelpDialogProps {
  keysAreOn: boolean;
  onKeysOn: (on: boolean) => void;
  onClose: () => void;
}

/** All keys of the desk, and the switch that turns them off. */
export function HelpDialog({ keysAreOn, onKeysOn, onClose }: HelpDialogProps) {
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Keys"
      width="wide"
      description="They work while you are not typing. Everything is also on the screen."
    >
      <div className="grid gap-6 sm:grid-cols-3">
        {keyGroups.map((group) => (
          <section key={group.title} aria-label={group.title}>
            <h3 className="mb-2 font-semibold">{group.title}</h3>
            <dl className="space-y-1.5 text-sm">
              {group.bindings.map((binding) => (
                <div key={binding.key} className="flex gap-3">
                  <dt className="w-14 shrink-0">
                    <kbd className="inline-block min-w-7 rounded border border-line-strong px-1.5 text-center font-sans text-xs leading-6 font-semibold">
                      {binding.shown}
                    </kbd>
                  </dt>
                  <dd>{binding.says}</dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
      </div>
      <Checkbox
        className="mt-5 border-t border-line pt-2"
        label="Single keys are on"
        checked={keysAreOn}
        onChange={(event) => onKeysOn(event.currentTarget.checked)}
      />
    </Dialog>
  );
}
