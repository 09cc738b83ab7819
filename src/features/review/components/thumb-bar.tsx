import { Check, CircleHelp, Layers, SkipForward, Undo2, type LucideIcon } from 'lucide-react';
import { joinClasses } from '../../../lib/join-classes.ts';
import type { ReviewCommand } from '../logic/key-map.ts';

interface ThumbBarProps {
  mayUndo: boolean;
  onCommand: (command: ReviewCommand) => void;
  onPiles: () => void;
}

/** The decision within reach of a thumb: at the lower edge of a narrow screen. */
export function ThumbBar({ mayUndo, onCommand, onPiles }: ThumbBarProps) {
  return (
    <section
      aria-label="Decide"
      className="flex items-stretch gap-1 border-t border-line bg-paper-raised px-2 pt-1.5 pb-[max(0.375rem,env(safe-area-inset-bottom))]"
    >
      <ThumbButton
        icon={Undo2}
        label="Undo"
        disabled={!mayUndo}
        onPress={() => onCommand({ does: 'undo' })}
      />
      <ThumbButton
        icon={CircleHelp}
        label="Undecided"
        onPress={() => onCommand({ does: 'pile', pile: 'undecided' })}
      />
      <ThumbButton icon={SkipForward} label="Later" onPress={() => onCommand({ does: 'skip' })} />
      <ThumbButton icon={Layers} label="Pile" onPress={onPiles} />
      <ThumbButton
        icon={Check}
        label="Keep it"
        isPrimary
        onPress={() => onCommand({ does: 'accept' })}
      />
    </section>
  );
}

interface ThumbButtonProps {
  icon: LucideIcon;
  label: string;
  isPrimary?: boolean;
  disabled?: boolean;
  onPress: () => void;
}

function ThumbButton({ icon: Icon, label, isPrimary, disabled, onPress }: ThumbButtonProps) {
  return (
    <button
      type="button"
      disabled={disabled}
      onClick={onPress}
      className={joinClasses(
        'flex min-h-13 min-w-0 flex-1 flex-col items-center justify-center gap-0.5 rounded-md text-xs font-semibold disabled:opacity-40',
        isPrimary ? 'flex-[1.6] bg-teal text-white' : 'text-ink-soft active:bg-paper-sunk',
      )}
    >
      <Icon aria-hidden size={20} />
      {label}
    </button>
  );
}
