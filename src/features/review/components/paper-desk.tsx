import { useMemo, useReducer, useState, type ReactNode } from 'react';
import { toast } from 'sonner';
import { requireClass } from '../../../../server/contract/document-classes.ts';
import type { Paper, Pile, UpdatePaper } from '../../../../server/contract/papers.ts';
import { useMay } from '../../../lib/use-may.ts';
import type { Desk } from '../hooks/use-desk.ts';
import { useReviewKeys } from '../hooks/use-review-keys.ts';
import { decidePile, findSuggestedPile, listObstacles } from '../logic/decision.ts';
import type { ReviewCommand } from '../logic/key-map.ts';
import { listMarks } from '../logic/marks.ts';
import { findNext, findPrevious } from '../logic/queue.ts';
import type { Sitting } from '../logic/sitting.ts';
import { firstView, reduceView, type View, type ViewAction } from '../logic/view.ts';
import { DecisionBar } from './decision-bar.tsx';
import { PageViewer } from './page-viewer.tsx';
import { PaperDialogs, type OpenDialog } from './paper-dialogs.tsx';
import { PaperPanel } from './paper-panel.tsx';
import { ThumbBar } from './thumb-bar.tsx';
import { UnscannedPaper } from './unscanned-paper.tsx';

interface PaperDeskProps {
  householdId: string;
  /** As it will be once everything on its way has arrived. */
  paper: Paper;
  /** As the server last said; what a change is based on. */
  stored: Paper;
  isWorking: boolean;
  desk: Desk;
  sitting: Sitting;
  isWide: boolean;
  keysAreOn: boolean;
  progress: ReactNode;
  notices: ReactNode;
  onGo: (paperId: string | null) => void;
  onHelp: () => void;
}

/** One paper on the desk: looking, correcting, deciding. Starts afresh with each paper. */
export function PaperDesk({
  householdId,
  paper,
  stored,
  isWorking,
  desk,
  sitting,
  isWide,
  keysAreOn,
  progress,
  notices,
  onGo,
  onHelp,
}: PaperDeskProps) {
  const pageCount = paper.pages.length;
  const [view, act] = useReducer(
    (before: View, action: ViewAction) => reduceView(before, action, pageCount),
    firstView,
  );
  const [showsMarks, setShowsMarks] = useState(true);
  const [activeMark, setActiveMark] = useState<string | null>(null);
  const [dialog, setDialog] = useState<OpenDialog | null>(null);
  const group = requireClass(paper.class).group;
  const mayReview = useMay('paper:review', householdId, group) && paper.status !== 'left';
  const mayHold = useMay('hold:place', householdId);
  const mayStepDown = useMay('paper:step-down', householdId, group);
  const marks = useMemo(() => listMarks(paper.facts), [paper.facts]);
  const suggested = findSuggestedPile(paper);
  const canStepDown =
    mayStepDown && paper.assessment.advisedUntil !== null && paper.steppedDown === null;
  const canJoin = paper.previousInScan !== null || paper.nextInScan !== null;
  const mayUndo = desk.memory.steps.length > 0 || paper.canUndo;

  const decide = (patch: UpdatePaper) => {
    setDialog(null);
    desk.decide(stored, patch);
  };
  const amend = (patch: UpdatePaper) => {
    setDialog(null);
    if (Object.keys(patch).length > 0) desk.amend(stored, patch);
  };
  const choosePile = (pile: Pile) => {
    const answer = decidePile(paper, pile, desk.memory.shownPageIds);
    if (answer.may) decide({ pile });
    else if (answer.because === 'obstacles') {
      setDialog({ shows: 'obstacles', pile, sentences: listObstacles(paper, pile) });
    } else {
      setDialog(null);
      toast('Look at the page first: nothing leaves unseen.', { id: 'unseen' });
    }
  };
  const goTo = (find: typeof findNext) => {
    const other = find(desk.queue.remaining, paper.number);
    if (other) onGo(other.id);
    else toast('There is no other paper in this round.', { id: 'unseen' });
  };

  const run = (command: ReviewCommand) => {
    switch (command.does) {
      case 'help':
        return onHelp();
      case 'skip':
        return goTo(findNext);
      case 'back':
        return goTo(findPrevious);
      case 'marks':
        return setShowsMarks(!showsMarks);
      case 'next-page':
      case 'previous-page':
      case 'zoom-in':
      case 'zoom-out':
      case 'turn':
      case 'fit':
        return act({ do: command.does });
      case 'hold':
        if (mayHold) setDialog({ shows: 'hold' });
        return;
      case 'step-down':
        if (canStepDown) setDialog({ shows: 'step-down' });
        return;
    }
    if (!mayReview) return;
    switch (command.does) {
      case 'accept':
        return paper.class === 'unrecognised'
          ? setDialog({ shows: 'kind' })
          : decide({ pile: 'file-here' });
      case 'pile':
        return choosePile(command.pile);
      case 'change-kind':
        return setDialog({ shows: 'kind' });
      case 'correct-facts':
        return setDialog({ shows: 'facts' });
      case 'why-kept':
        return setDialog({ shows: 'keeping', startAt: 'why' });
      case 'place':
        return setDialog({ shows: 'keeping', startAt: 'place' });
      case 'note':
        return setDialog({ shows: 'note' });
      case 'join':
        if (canJoin) setDialog({ shows: 'join' });
        return;
      case 'cut':
        if (pageCount > 1) setDialog({ shows: 'cut' });
        return;
      case 'undo':
        return void desk.undo(stored);
    }
  };
  useReviewKeys(keysAreOn && dialog === null, run);

  const viewer =
    pageCount > 0 ? (
      <PageViewer
        pages={paper.pages}
        view={view}
        onAct={act}
        marks={marks}
        showsMarks={showsMarks}
        onToggleMarks={() => setShowsMarks(!showsMarks)}
        activeMark={activeMark}
        onActiveMark={setActiveMark}
        onShown={sitting.notePageShown}
      />
    ) : (
      <UnscannedPaper paper={paper} />
    );
  const panel = (
    <PaperPanel
      householdId={householdId}
      paper={paper}
      isWorking={isWorking}
      mayReview={mayReview}
      mayHold={mayHold}
      canStepDown={canStepDown}
      activeMark={activeMark}
      onActiveMark={setActiveMark}
      onShowPage={(page) => act({ do: 'show-page', pageIndex: page - 1 })}
      onChooseKind={(kind) => amend({ class: kind })}
      onAmend={amend}
      onCommand={run}
    />
  );
  const dialogs = dialog && (
    <PaperDialogs
      dialog={dialog}
      householdId={householdId}
      paper={paper}
      stored={stored}
      pageIndex={view.pageIndex}
      suggested={suggested}
      desk={desk}
      onAmend={amend}
      onDecide={decide}
      onPile={choosePile}
      onGo={onGo}
      onClose={() => setDialog(null)}
    />
  );

  if (isWide) {
    return (
      <div className="flex h-[calc(100dvh-var(--app-top,0px))] min-h-[34rem]">
        <div className="min-w-0 flex-1 px-4 pt-1 pb-4">{viewer}</div>
        <div className="flex w-[27rem] shrink-0 flex-col border-l border-line bg-paper-raised 2xl:w-[31rem]">
          {progress}
          <div className="min-h-0 flex-1 space-y-5 overflow-y-auto px-5 py-4">
            {notices}
            {panel}
          </div>
          {mayReview && (
            <DecisionBar
              chosen={paper.pile}
              suggested={suggested}
              mayUndo={mayUndo}
              onCommand={run}
            />
          )}
        </div>
        {dialogs}
      </div>
    );
  }
  return (
    <div className="flex flex-1 flex-col pb-20">
      {progress}
      <div className="space-y-5 px-4">
        {notices}
        <div className={pageCount > 0 ? 'h-[62dvh] min-h-80' : ''}>{viewer}</div>
        {panel}
      </div>
      {mayReview && (
        <div className="fixed inset-x-0 bottom-0 z-20">
          <ThumbBar
            mayUndo={mayUndo}
            onCommand={run}
            onPiles={() => setDialog({ shows: 'piles' })}
          />
        </div>
      )}
      {dialogs}
    </div>
  );
}
