import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import type { Paper } from '../../../../server/contract/papers.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { formatCount } from '../../../lib/format.ts';
import { pageThumbnailUrl, paperQuery } from '../api/get-paper.ts';

interface JoinDialogProps {
  paper: Paper;
  onJoin: (neighbourId: string) => Promise<void>;
  onClose: () => void;
}

/** Joins the paper with the one that lay before or after it in the same scan. */
export function JoinDialog({ paper, onJoin, onClose }: JoinDialogProps) {
  const [failure, setFailure] = useState<string>();
  const [isBusy, setIsBusy] = useState(false);
  const join = async (neighbourId: string) => {
    setIsBusy(true);
    try {
      await onJoin(neighbourId);
    } catch (error) {
      setFailure(sentenceOf(error));
      setIsBusy(false);
    }
  };
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Join into one paper"
      description="Both are read and dated anew as one."
    >
      {failure && <Banner tone="fault" alert title={failure} className="mb-4" />}
      <div className="grid grid-cols-2 gap-4">
        {paper.previousInScan && (
          <Neighbour
            paperId={paper.previousInScan}
            where="With the paper before"
            isBusy={isBusy}
            onChoose={() => void join(paper.previousInScan ?? '')}
          />
        )}
        {paper.nextInScan && (
          <Neighbour
            paperId={paper.nextInScan}
            where="With the paper after"
            isBusy={isBusy}
            onChoose={() => void join(paper.nextInScan ?? '')}
          />
        )}
      </div>
    </Dialog>
  );
}

interface NeighbourProps {
  paperId: string;
  where: string;
  isBusy: boolean;
  onChoose: () => void;
}

function Neighbour({ paperId, where, isBusy, onChoose }: NeighbourProps) {
  const { data } = useQuery(paperQuery(paperId));
  return (
    <button
      type="button"
      disabled={isBusy}
      onClick={onChoose}
      className="flex min-h-56 flex-col items-center gap-2 rounded-md border border-line-strong bg-paper p-3 text-center hover:border-teal disabled:opacity-55"
    >
      <span className="font-semibold">{where}</span>
      <span className="flex h-36 items-center justify-center">
        {data?.firstPageId && (
          <img
            src={pageThumbnailUrl(data.firstPageId)}
            alt=""
            className="max-h-36 border border-line bg-paper-raised"
          />
        )}
      </span>
      <span className="text-sm text-ink-soft">
        {data
          ? `${classLabel(data.class)}, no. ${data.number}, ${formatCount(data.pages.length, 'page')}`
          : '…'}
      </span>
    </button>
  );
}
