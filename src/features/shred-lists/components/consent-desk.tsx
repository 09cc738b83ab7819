import { useState } from 'react';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { formatCount } from '../../../lib/format.ts';
import { countAmounts, listGoing } from '../logic/consent.ts';
import { listBlocked, listKeptBack } from '../logic/keep-back.ts';
import { describeChanges } from '../logic/list-changes.ts';
import { useKeepBack } from '../logic/use-keep-back.ts';
import { ActionBar } from './action-bar.tsx';
import { ConsentDialog } from './consent-dialog.tsx';
import { KeepBackButton } from './keep-back-button.tsx';
import { RowsWithPictures } from './rows-with-pictures.tsx';

interface ConsentDeskProps {
  list: ShredList;
  /** Set when the practice records the client's instruction: the household's day. */
  instructionToday: string | null;
  onAgreed: () => void;
  /** Back to the list as it is; absent where consent is all there is to do. */
  onLeave?: () => void;
}

/** Looks through the list, keeps single papers back, agrees to the rest. */
export function ConsentDesk({ list, instructionToday, onAgreed, onLeave }: ConsentDeskProps) {
  // Consent is to what was seen: the version stays as it was until the person has been told of a change.
  const [seen, setSeen] = useState(list);
  const keepBack = useKeepBack(list);
  const [isAgreeing, setIsAgreeing] = useState(false);
  const changes = describeChanges(seen, list);
  const isOver = !list.can.approve;
  const going = countAmounts(listGoing(list.rows, keepBack.papers));
  const staying = listKeptBack(list.rows, keepBack.papers).length;
  const blocked = listBlocked(list.rows, keepBack.papers);
  return (
    <>
      {changes.length > 0 ? (
        <Banner
          alert
          tone="soon"
          className="mb-4"
          title="The list has changed since you opened it"
          action={
            isOver && !onLeave ? null : (
              <Button size="small" onClick={() => (isOver ? onLeave?.() : setSeen(list))}>
                {isOver ? 'Show it as it is' : 'I have seen this'}
              </Button>
            )
          }
        >
          <ul className="list-disc pl-5">
            {changes.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        </Banner>
      ) : null}
      {blocked.length > 0 && !isOver ? (
        <Banner
          tone="soon"
          className="mb-4"
          title={`${formatCount(blocked.length, 'paper')} may not go now`}
          action={
            <Button size="small" onClick={() => keepBack.addAll(blocked.map((row) => row.paper))}>
              Keep {blocked.length === 1 ? 'it' : 'them'} back
            </Button>
          }
        >
          The reason stands beside the paper. Keep it back to agree to the others.
        </Banner>
      ) : null}
      <RowsWithPictures
        rows={list.rows}
        keepBack={keepBack.papers}
        renderControl={(row) =>
          row.keptBack || isOver ? null : (
            <KeepBackButton
              row={row}
              isKept={keepBack.papers.has(row.paper)}
              onToggle={() => keepBack.toggle(row.paper)}
            />
          )
        }
      />
      {isOver ? null : (
        <ActionBar
          words={
            going.papers === 0 ? (
              'Everything stays. There is nothing to agree to; tell your organiser, who gives the list up.'
            ) : (
              <>
                <span className="font-semibold">{formatCount(going.papers, 'paper')} may go</span>
                {staying > 0 ? `, ${staying} ${staying === 1 ? 'stays' : 'stay'}` : ''}
              </>
            )
          }
        >
          {onLeave ? <Button onClick={onLeave}>Cancel</Button> : null}
          <Button
            tone="primary"
            disabled={going.papers === 0 || changes.length > 0 || blocked.length > 0}
            onClick={() => setIsAgreeing(true)}
          >
            {instructionToday ? 'Record what they said' : 'Go on to agree'}
          </Button>
        </ActionBar>
      )}
      {isAgreeing ? (
        <ConsentDialog
          list={seen}
          keepBack={keepBack.papers}
          instructionToday={instructionToday}
          onAgreed={() => {
            keepBack.forget();
            setIsAgreeing(false);
            onAgreed();
          }}
          onClose={() => setIsAgreeing(false)}
        />
      ) : null}
    </>
  );
}
