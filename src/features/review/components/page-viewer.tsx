import { useEffect, useRef, type PointerEvent } from 'react';
import type { Paper } from '../../../../server/contract/papers.ts';
import { joinClasses } from '../../../lib/join-classes.ts';
import { useSize } from '../hooks/use-size.ts';
import type { Mark } from '../logic/marks.ts';
import { placePage, type View, type ViewAction } from '../logic/view.ts';
import { PageMarks } from './page-marks.tsx';
import { PagePicture } from './page-picture.tsx';
import { PageStrip } from './page-strip.tsx';
import { ViewerTools } from './viewer-tools.tsx';

interface PageViewerProps {
  pages: Paper['pages'];
  view: View;
  onAct: (action: ViewAction) => void;
  marks: Mark[];
  showsMarks: boolean;
  onToggleMarks: () => void;
  activeMark: string | null;
  onActiveMark: (key: string | null) => void;
  onShown: (pageId: string) => void;
}

const margin = 12;

/** The page as it lies there: large, turnable, with quiet outlines where facts were read. */
export function PageViewer({
  pages,
  view,
  onAct,
  marks,
  showsMarks,
  onToggleMarks,
  activeMark,
  onActiveMark,
  onShown,
}: PageViewerProps) {
  const frame = useRef<HTMLDivElement>(null);
  const size = useSize(frame);
  const page = pages[view.pageIndex] ?? pages[0];
  const pageId = page?.id;

  useEffect(() => {
    frame.current?.scrollTo?.({ top: 0, left: 0 });
  }, [pageId]);

  if (!page) return null;
  const placed = placePage(
    { width: Math.max(1, page.width), height: Math.max(1, page.height) },
    {
      width: Math.max(200, (size?.width ?? 0) - 2 * margin),
      height: Math.max(200, (size?.height ?? 0) - 2 * margin),
    },
    view,
  );
  const scrolls =
    size !== null &&
    (placed.room.width + 2 * margin > size.width || placed.room.height + 2 * margin > size.height);
  // What scrolls must be within reach of the keyboard.
  const reach = scrolls ? { tabIndex: 0 } : {};
  const onPage = marks.filter((mark) => mark.page === page.number);

  return (
    <section aria-label="The paper" className="flex h-full min-h-0 flex-col">
      <ViewerTools
        view={view}
        pageCount={pages.length}
        hasMarks={marks.length > 0}
        showsMarks={showsMarks}
        onAct={onAct}
        onToggleMarks={onToggleMarks}
      />
      <div
        ref={frame}
        role="group"
        aria-label={`Page ${page.number} of ${pages.length}`}
        {...reach}
        onPointerDown={scrolls ? startPanning : undefined}
        className={joinClasses(
          'relative min-h-0 flex-1 overflow-auto rounded bg-paper-sunk',
          scrolls && 'cursor-grab',
        )}
      >
        <div
          className="relative mx-auto"
          style={{
            width: placed.room.width,
            height: placed.room.height,
            marginTop: Math.max(margin, ((size?.height ?? 0) - placed.room.height) / 2),
            marginBottom: margin,
          }}
        >
          <div
            className="absolute top-1/2 left-1/2 bg-paper-raised shadow-md"
            style={{
              width: placed.page.width,
              height: placed.page.height,
              transform: `translate(-50%, -50%) rotate(${view.turn * 90}deg)`,
            }}
          >
            <PagePicture
              key={page.id}
              pageId={page.id}
              alt={`Page ${page.number} of ${pages.length}`}
              onShown={onShown}
            />
            {showsMarks && (
              <PageMarks marks={onPage} activeKey={activeMark} onActive={onActiveMark} />
            )}
          </div>
        </div>
      </div>
      {pages.length > 1 && (
        <PageStrip
          pages={pages}
          shownIndex={view.pageIndex}
          onShow={(pageIndex) => onAct({ do: 'show-page', pageIndex })}
        />
      )}
    </section>
  );
}

/** Drags a page that is larger than its frame; fingers scroll by themselves. */
function startPanning(event: PointerEvent<HTMLDivElement>): void {
  if (event.pointerType !== 'mouse' || event.button !== 0) return;
  const frame = event.currentTarget;
  const from = {
    x: event.clientX,
    y: event.clientY,
    left: frame.scrollLeft,
    top: frame.scrollTop,
  };
  frame.setPointerCapture(event.pointerId);
  const move = (at: globalThis.PointerEvent) => {
    frame.scrollLeft = from.left - (at.clientX - from.x);
    frame.scrollTop = from.top - (at.clientY - from.y);
  };
  const stop = () => {
    frame.removeEventListener('pointermove', move);
    frame.removeEventListener('pointerup', stop);
    frame.removeEventListener('pointercancel', stop);
  };
  frame.addEventListener('pointermove', move);
  frame.addEventListener('pointerup', stop);
  frame.addEventListener('pointercancel', stop);
}
