import { useQuery } from '@tanstack/react-query';
import { Keyboard } from 'lucide-react';
import { useState } from 'react';
import { Button } from '../../../components/ui/button.tsx';
import { KeyHint } from '../../../components/ui/key-hint.tsx';
import { ErrorState } from '../../../components/ui/states.tsx';
import { useMedia } from '../../../lib/use-media.ts';
import { paperQuery } from '../api/get-paper.ts';
import { useDesk } from '../hooks/use-desk.ts';
import { useKeysSetting } from '../hooks/use-keys-setting.ts';
import { usePrefetch } from '../hooks/use-queue.ts';
import { describeToGo, type Round } from '../logic/queue.ts';
import type { Sitting } from '../logic/sitting.ts';
import { ConflictDialog } from './conflict-dialog.tsx';
import { DeskSkeleton } from './desk-skeleton.tsx';
import { HelpDialog } from './help-dialog.tsx';
import { PaperDesk } from './paper-desk.tsx';
import { ReviewDone } from './review-done.tsx';
import { UnsentBanner } from './unsent-banner.tsx';
import type { OutboxEntry } from '../logic/outbox.ts';
import { joinClasses } from '../../../lib/join-classes.ts';

interface ReviewDeskProps {
  householdId: string;
  /** The paper in view; null for the next one of the round. */
  paperId: string | null;
  round: Round;
  sitting: Sitting;
  /** Shows another paper, or with null the place where a round begins and ends. */
  onGo: (paperId: string | null) => void;
}

/** The desk: one paper at a time, its page on one side, the suggestion and the decision on the other. */
export function ReviewDesk({ householdId, paperId, round, sitting, onGo }: ReviewDeskProps) {
  const desk = useDesk({ householdId, round, sitting, onGo });
  const [keysAreOn, setKeysAreOn] = useKeysSetting();
  const [helpIsOpen, setHelpIsOpen] = useState(false);
  const [conflict, setConflict] = useState<OutboxEntry | null>(null);
  const isWide = useMedia('(min-width: 64rem)');
  const { queue } = desk;
  const shownId = paperId ?? queue.remaining[0]?.id ?? null;
  const query = useQuery({ ...paperQuery(shownId ?? ''), enabled: shownId !== null });
  const stored = query.data;
  usePrefetch(queue.remaining, stored?.number ?? null);

  const progress = (
    <div
      className={joinClasses(
        'flex shrink-0 items-center justify-between gap-3 border-b border-line bg-paper-raised',
        isWide ? 'px-5 py-2' : 'px-4 py-1',
      )}
    >
      <p className="font-semibold tabular-nums" aria-live="polite">
        {queue.isLoading ? '…' : describeToGo(queue.toGo)}
        {round === 'second' && <span className="font-normal text-ink-soft">, second look</span>}
      </p>
      <Button
        tone="plain"
        size="small"
        className="pointer-coarse:hidden"
        icon={<Keyboard aria-hidden />}
        onClick={() => setHelpIsOpen(true)}
      >
        Keys <KeyHint keys="?" />
      </Button>
    </div>
  );
  const notices = (
    <UnsentBanner
      snapshot={desk.snapshot}
      onRetry={() => void desk.outbox.flush()}
      onSettle={setConflict}
      onLook={(entry) => {
        desk.outbox.remove(entry.id);
        onGo(entry.paperId);
      }}
      onDrop={(entry) => desk.outbox.remove(entry.id)}
    />
  );

  const renderPaper = () => {
    if (shownId === null) {
      if (queue.isLoading) return <DeskSkeleton isWide={isWide} />;
      if (queue.error) {
        return (
          <div className="p-4">
            <ErrorState
              error={queue.error}
              what="the papers to look at"
              onRetry={() => void queue.refetch()}
            />
          </div>
        );
      }
      return (
        <ReviewDone
          householdId={householdId}
          round={round}
          notices={notices}
          onSecondRound={() => sitting.forgetPassed()}
        />
      );
    }
    if (!stored) {
      return query.error ? (
        <div className="p-4">
          <ErrorState error={query.error} what="this paper" onRetry={() => void query.refetch()} />
        </div>
      ) : (
        <DeskSkeleton isWide={isWide} />
      );
    }
    const { paper, isWorking } = desk.overlay(stored);
    return (
      <PaperDesk
        key={paper.id}
        householdId={householdId}
        paper={paper}
        stored={stored}
        isWorking={isWorking}
        desk={desk}
        sitting={sitting}
        isWide={isWide}
        keysAreOn={keysAreOn && !helpIsOpen && conflict === null}
        progress={progress}
        notices={notices}
        onGo={onGo}
        onHelp={() => setHelpIsOpen(true)}
      />
    );
  };

  return (
    <>
      {renderPaper()}
      {helpIsOpen && (
        <HelpDialog
          keysAreOn={keysAreOn}
          onKeysOn={setKeysAreOn}
          onClose={() => setHelpIsOpen(false)}
        />
      )}
      {conflict?.current && (
        <ConflictDialog
          entry={conflict}
          current={conflict.current}
          onSettle={(patch) => {
            if (patch && conflict.current) {
              desk.outbox.resend(conflict.id, patch, conflict.current.version);
            } else {
              desk.outbox.remove(conflict.id);
            }
            setConflict(null);
          }}
          onClose={() => setConflict(null)}
        />
      )}
    </>
  );
}
