import {
  ChevronLeft,
  ChevronRight,
  Maximize,
  RotateCw,
  ScanText,
  ZoomIn,
  ZoomOut,
  type LucideIcon,
} from 'lucide-react';
import { joinClasses } from '../../../lib/join-classes.ts';
import { findShownKey, type ReviewCommand } from '../logic/key-map.ts';
import type { View, ViewAction } from '../logic/view.ts';

interface ViewerToolsProps {
  view: View;
  pageCount: number;
  hasMarks: boolean;
  showsMarks: boolean;
  onAct: (action: ViewAction) => void;
  onToggleMarks: () => void;
}

/** The row of tools over a page: pages, size, turning, marks. */
export function ViewerTools({
  view,
  pageCount,
  hasMarks,
  showsMarks,
  onAct,
  onToggleMarks,
}: ViewerToolsProps) {
  return (
    <div role="toolbar" aria-label="Page" className="flex items-center gap-0.5 text-ink-soft">
      {pageCount > 1 && (
        <>
          <Tool
            icon={ChevronLeft}
            name="Page before"
            command={{ does: 'previous-page' }}
            disabled={view.pageIndex === 0}
            onPress={() => onAct({ do: 'previous-page' })}
          />
          <span className="px-1 text-sm whitespace-nowrap tabular-nums" aria-live="polite">
            {view.pageIndex + 1} of {pageCount}
          </span>
          <Tool
            icon={ChevronRight}
            name="Next page"
            command={{ does: 'next-page' }}
            disabled={view.pageIndex === pageCount - 1}
            onPress={() => onAct({ do: 'next-page' })}
          />
        </>
      )}
      <span className="grow" />
      <Tool
        icon={ZoomOut}
        name="Smaller"
        command={{ does: 'zoom-out' }}
        onPress={() => onAct({ do: 'zoom-out' })}
      />
      <Tool
        icon={ZoomIn}
        name="Larger"
        command={{ does: 'zoom-in' }}
        onPress={() => onAct({ do: 'zoom-in' })}
      />
      <Tool
        icon={Maximize}
        name={view.fit === 'page' ? 'Full width' : 'Whole page'}
        command={{ does: 'fit' }}
        onPress={() => onAct({ do: 'fit' })}
      />
      <Tool
        icon={RotateCw}
        name="Turn the page"
        command={{ does: 'turn' }}
        onPress={() => onAct({ do: 'turn' })}
      />
      {hasMarks && (
        <Tool
          icon={ScanText}
          name="Marks on the page"
          command={{ does: 'marks' }}
          pressed={showsMarks}
          onPress={onToggleMarks}
        />
      )}
    </div>
  );
}

interface ToolProps {
  icon: LucideIcon;
  name: string;
  command: ReviewCommand;
  disabled?: boolean;
  pressed?: boolean;
  onPress: () => void;
}

function Tool({ icon: Icon, name, command, disabled, pressed, onPress }: ToolProps) {
  const key = findShownKey(command);
  return (
    <button
      type="button"
      aria-label={name}
      title={key ? `${name} (${key})` : name}
      aria-pressed={pressed}
      disabled={disabled}
      onClick={onPress}
      className={joinClasses(
        'flex h-11 w-11 items-center justify-center rounded hover:bg-paper-sunk disabled:opacity-35',
        pressed && 'text-teal',
      )}
    >
      <Icon aria-hidden="true" size={20} />
    </button>
  );
}
