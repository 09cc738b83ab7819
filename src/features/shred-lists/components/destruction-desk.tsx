import { useState } from 'react';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { Button } from '../../../components/ui/button.tsx';
import { countOutcomes, fillWithDestroyed } from '../logic/outcomes.ts';
import { useOutcomes } from '../logic/use-outcomes.ts';
import { ActionBar } from './action-bar.tsx';
import { DestructionDialog } from './destruction-dialog.tsx';
import { OutcomeChoice } from './outcome-choice.tsx';
import { RowsWithPictures } from './rows-with-pictures.tsx';

interface DestructionDeskProps {
  list: ShredList;
  /** The household's day. */
  today: string;
  onRecorded: () => void;
  onLeave: () => void;
}

/** At the shredder: ticks off paper by paper what became of it, then records the whole. */
export function DestructionDesk({ list, today, onRecorded, onLeave }: DestructionDeskProps) {
  const [outcomes, setOutcomes, forgetOutcomes] = useOutcomes(list);
  const [isRecording, setIsRecording] = useState(false);
  const counts = countOutcomes(list.rows, outcomes);
  const filled = fillWithDestroyed(list.rows, outcomes);
  const canFill = countOutcomes(list.rows, filled).none < counts.none;
  return (
    <>
      <RowsWithPictures
        rows={list.rows}
        renderControl={(row) =>
          row.keptBack ? null : (
            <OutcomeChoice
              row={row}
              value={outcomes[row.paper]}
              onChange={(outcome) => setOutcomes({ ...outcomes, [row.paper]: outcome })}
            />
          )
        }
      />
      <ActionBar words={<OutcomeWords counts={counts} />}>
        <Button onClick={onLeave}>Not now</Button>
        {canFill ? (
          <Button onClick={() => setOutcomes(filled)}>
            {counts.none === Object.values(counts).reduce((a, b) => a + b)
              ? 'All were shredded'
              : 'The rest were shredded'}
          </Button>
        ) : null}
        <Button tone="primary" disabled={counts.none > 0} onClick={() => setIsRecording(true)}>
          Go on to record
        </Button>
      </ActionBar>
      {isRecording ? (
        <DestructionDialog
          list={list}
          today={today}
          outcomes={outcomes}
          onRecorded={() => {
            forgetOutcomes();
            setIsRecording(false);
            onRecorded();
          }}
          onClose={() => setIsRecording(false)}
        />
      ) : null}
    </>
  );
}

function OutcomeWords({ counts }: { counts: ReturnType<typeof countOutcomes> }) {
  const words = [
    counts.none > 0 ? `${counts.none} to go` : null,
    counts.destroyed > 0 ? `${counts.destroyed} shredded` : null,
    counts['kept-back'] > 0 ? `${counts['kept-back']} kept back` : null,
    counts['not-found'] > 0 ? `${counts['not-found']} not found` : null,
  ].filter(Boolean);
  return <span className="font-semibold">{words.join(', ')}</span>;
}
