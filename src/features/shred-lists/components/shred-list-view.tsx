import { useState } from 'react';
import { toast } from 'sonner';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { Button } from '../../../components/ui/button.tsx';
import { useRemoveShredRow } from '../api/remove-shred-row.ts';
import { useSendShredList } from '../api/send-shred-list.ts';
import { ConsentDesk } from './consent-desk.tsx';
import { DestructionDesk } from './destruction-desk.tsx';
import { LeftOut } from './left-out.tsx';
import { ListSide } from './list-side.tsx';
import { NextStep } from './next-step.tsx';
import { RefusalBanner } from './refusal-banner.tsx';
import { RowsWithPictures } from './rows-with-pictures.tsx';
import { StageTrack } from './stage-track.tsx';
import { VoidDialog } from './void-dialog.tsx';

interface ShredListViewProps {
  list: ShredList;
  /** The household's day, `yyyy-mm-dd`. */
  today: string;
  /** The person speaks for themself: consent is theirs, not one recorded for somebody else. */
  isOwnConsent: boolean;
  mayPrepare: boolean;
  mayReview: boolean;
}

type Mode = 'look' | 'consent' | 'destruction';

function findTask(mode: Mode, isOwnConsent: boolean) {
  if (mode === 'look') return null;
  if (mode === 'destruction') return 'destruction';
  return isOwnConsent ? 'own-consent' : 'instruction';
}

/** One shred list from gathering to the record. */
export function ShredListView({
  list,
  today,
  isOwnConsent,
  mayPrepare,
  mayReview,
}: ShredListViewProps) {
  const [mode, setMode] = useState<Mode>(isOwnConsent && list.can.approve ? 'consent' : 'look');
  const [isGivingUp, setIsGivingUp] = useState(false);
  const removal = useRemoveShredRow(list);
  const sending = useSendShredList(list);
  const mayTakeOff = mayPrepare && (list.status === 'draft' || list.status === 'sent');
  const lookAgain = () => setMode('look');

  const renderPapers = () => {
    if (mode === 'consent') {
      return (
        <ConsentDesk
          list={list}
          instructionToday={isOwnConsent ? null : today}
          onAgreed={() => {
            lookAgain();
            toast.success('Agreed. Nothing is shredded before the day that was chosen.');
          }}
          {...(isOwnConsent && list.can.approve ? {} : { onLeave: lookAgain })}
        />
      );
    }
    if (mode === 'destruction') {
      return (
        <DestructionDesk
          list={list}
          today={today}
          onRecorded={() => {
            lookAgain();
            toast.success('Recorded.');
          }}
          onLeave={lookAgain}
        />
      );
    }
    return (
      <RowsWithPictures
        rows={list.rows}
        {...(mayTakeOff
          ? {
              renderControl: (row) => (
                <Button
                  size="small"
                  aria-label={`Take paper ${row.paperNumber} off the list`}
                  busy={removal.isPending && removal.variables === row.paper}
                  disabled={removal.isPending}
                  onClick={() =>
                    removal.mutate(row.paper, {
                      onSuccess: () =>
                        toast.success(
                          `Paper ${row.paperNumber} is off the list. It stays on the shred pile.`,
                        ),
                    })
                  }
                >
                  Take off
                </Button>
              ),
            }
          : {})}
      />
    );
  };

  return (
    <>
      {list.status === 'void' ? null : <StageTrack list={list} />}
      <NextStep list={list} today={today} task={findTask(mode, isOwnConsent)}>
        {mode !== 'look' ? null : (
          <>
            {list.can.send ? (
              <Button
                tone="primary"
                busy={sending.isPending}
                onClick={() =>
                  sending.mutate(undefined, {
                    onSuccess: () => toast.success('Sent. The client gets an e-mail with a link.'),
                  })
                }
              >
                Send to the client
              </Button>
            ) : null}
            {list.can.approve && !isOwnConsent ? (
              <Button onClick={() => setMode('consent')}>Record the client’s instruction</Button>
            ) : null}
            {list.can.carryOut ? (
              <Button tone="primary" onClick={() => setMode('destruction')}>
                Record the shredding
              </Button>
            ) : null}
            {list.can.void ? (
              <Button tone="plain" onClick={() => setIsGivingUp(true)}>
                Give the list up
              </Button>
            ) : null}
          </>
        )}
      </NextStep>
      {removal.error ? (
        <RefusalBanner error={removal.error} title="Not taken off" className="mb-4" />
      ) : null}
      {sending.error ? (
        <RefusalBanner error={sending.error} title="Not sent" className="mb-4" />
      ) : null}
      <div className="grid gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,1fr)_19rem]">
        <div className="min-w-0">
          {list.rows.length > 0 ? renderPapers() : null}
          <LeftOut
            list={list}
            mayReview={mayReview}
            isOpen={mayPrepare && list.status === 'draft'}
          />
        </div>
        <ListSide list={list} />
      </div>
      {isGivingUp ? (
        <VoidDialog
          list={list}
          onGivenUp={() => {
            setIsGivingUp(false);
            lookAgain();
            toast.success('Given up. Its papers stay where they were.');
          }}
          onClose={() => setIsGivingUp(false)}
        />
      ) : null}
    </>
  );
}
