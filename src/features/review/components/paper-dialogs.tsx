import { useQueryClient } from '@tanstack/react-query';
import { toast } from 'sonner';
import type { Paper, Pile, UpdatePaper } from '../../../../server/contract/papers.ts';
import { useMay } from '../../../lib/use-may.ts';
import { paperQuery } from '../api/get-paper.ts';
import { joinPaper } from '../api/join-paper.ts';
import { placeHold, type HoldInput } from '../api/place-hold.ts';
import { splitPaper } from '../api/split-paper.ts';
import { stepDown } from '../api/step-down.ts';
import type { Desk } from '../hooks/use-desk.ts';
import { CutDialog } from './cut-dialog.tsx';
import { FactsDialog } from './facts-dialog.tsx';
import { HoldDialog } from './hold-dialog.tsx';
import { JoinDialog } from './join-dialog.tsx';
import { KeepingDialog } from './keeping-dialog.tsx';
import { KindDialog } from './kind-dialog.tsx';
import { NoteDialog } from './note-dialog.tsx';
import { ObstaclesDialog } from './obstacles-dialog.tsx';
import { PilesDialog } from './piles-dialog.tsx';
import { StepDownDialog } from './step-down-dialog.tsx';

export type OpenDialog =
  | { shows: 'kind' | 'facts' | 'note' | 'hold' | 'step-down' | 'join' | 'cut' | 'piles' }
  | { shows: 'keeping'; startAt: 'why' | 'place' }
  | { shows: 'obstacles'; pile: Pile; sentences: string[] };

interface PaperDialogsProps {
  dialog: OpenDialog;
  householdId: string;
  paper: Paper;
  stored: Paper;
  pageIndex: number;
  suggested: Pile | null;
  desk: Desk;
  onAmend: (patch: UpdatePaper) => void;
  onDecide: (patch: UpdatePaper) => void;
  onPile: (pile: Pile) => void;
  onGo: (paperId: string | null) => void;
  onClose: () => void;
}

/** The one dialog that is open over a paper. */
export function PaperDialogs({
  dialog,
  householdId,
  paper,
  stored,
  pageIndex,
  suggested,
  desk,
  onAmend,
  onDecide,
  onPile,
  onGo,
  onClose,
}: PaperDialogsProps) {
  const queryClient = useQueryClient();
  const isPractice = useMay('household:update', householdId);

  /** The paper's version once everything on its way has arrived. */
  const settleVersion = async (): Promise<number> => {
    await desk.outbox.flush();
    return (queryClient.getQueryData(paperQuery(stored.id).queryKey) ?? stored).version;
  };
  /** Keeps what the server answered, and shows it. */
  const finish = (papers: Paper[], words: string) => {
    for (const changed of papers) desk.storePaper(changed);
    void queryClient.invalidateQueries({ queryKey: ['households', householdId] });
    toast(words, { id: 'decision' });
    onClose();
    if (papers[0] && papers[0].id !== stored.id) onGo(papers[0].id);
  };

  switch (dialog.shows) {
    case 'kind':
      return (
        <KindDialog
          paper={paper}
          onChoose={(kind) => onAmend(kind === paper.class ? {} : { class: kind })}
          onClose={onClose}
        />
      );
    case 'facts':
      return <FactsDialog paper={paper} onSave={(facts) => onAmend({ facts })} onClose={onClose} />;
    case 'keeping':
      return (
        <KeepingDialog
          paper={paper}
          startAt={dialog.startAt}
          knownPlaces={desk.memory.places}
          onSave={(patch) => (patch.pile === undefined ? onAmend(patch) : onDecide(patch))}
          onClose={onClose}
        />
      );
    case 'note':
      return (
        <NoteDialog paper={paper} isPractice={isPractice} onSave={onAmend} onClose={onClose} />
      );
    case 'piles':
      return (
        <PilesDialog
          chosen={paper.pile}
          suggested={suggested}
          onChoose={onPile}
          onClose={onClose}
        />
      );
    case 'obstacles':
      return (
        <ObstaclesDialog
          pile={dialog.pile}
          sentences={dialog.sentences}
          onKeep={() => onDecide({ pile: 'file-here' })}
          onPutThere={() => onDecide({ pile: dialog.pile })}
          onClose={onClose}
        />
      );
    case 'hold':
      return (
        <HoldDialog
          paperId={stored.id}
          onPlace={async (input: HoldInput) => {
            await placeHold(householdId, input);
            const fresh = await queryClient.fetchQuery({
              ...paperQuery(stored.id),
              staleTime: 0,
            });
            finish([fresh], 'Noted: don’t destroy yet.');
          }}
          onClose={onClose}
        />
      );
    case 'step-down':
      return (
        <StepDownDialog
          paper={paper}
          onStepDown={async (reason) => {
            const changed = await stepDown(stored.id, reason, await settleVersion());
            finish([changed], 'The shorter time stands.');
          }}
          onClose={onClose}
        />
      );
    case 'join':
      return (
        <JoinDialog
          paper={paper}
          onJoin={async (neighbourId) => {
            const joined = await joinPaper(stored.id, neighbourId, await settleVersion());
            finish([joined], 'Joined into one paper.');
          }}
          onClose={onClose}
        />
      );
    case 'cut':
      return (
        <CutDialog
          paper={paper}
          pageIndex={pageIndex}
          onCut={async (beforePage) => {
            const { first, second } = await splitPaper(
              stored.id,
              beforePage,
              await settleVersion(),
            );
            finish([first, second], `Cut apart: no. ${first.number} and no. ${second.number}.`);
          }}
          onClose={onClose}
        />
      );
  }
}
