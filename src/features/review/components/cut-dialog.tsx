import { useState } from 'react';
import type { Paper } from '../../../../server/contract/papers.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { joinClasses } from '../../../lib/join-classes.ts';
import { pageThumbnailUrl } from '../api/get-paper.ts';
import { takeFocus } from '../logic/take-focus.ts';

interface CutDialogProps {
  paper: Paper;
  /** The page in view, from 0: the cut is offered before it. */
  pageIndex: number;
  onCut: (beforePage: number) => Promise<void>;
  onClose: () => void;
}

/** Cuts a paper in two before one of its pages. */
export function CutDialog({ paper, pageIndex, onCut, onClose }: CutDialogProps) {
  const [before, setBefore] = useState(Math.max(2, pageIndex + 1));
  const [failure, setFailure] = useState<string>();
  const [isBusy, setIsBusy] = useState(false);
  const cut = async () => {
    setIsBusy(true);
    try {
      await onCut(before);
    } catch (error) {
      setFailure(sentenceOf(error));
      setIsBusy(false);
    }
  };
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Cut apart"
      description="Choose the page with which the second paper begins. Both are read and dated anew."
      footer={
        <Button ref={takeFocus} tone="primary" busy={isBusy} onClick={() => void cut()}>
          Cut before page {before}
        </Button>
      }
    >
      {failure && <Banner tone="fault" alert title={failure} className="mb-4" />}
      <ol className="flex flex-wrap items-end gap-x-2 gap-y-4">
        {paper.pages.map((page) => (
          <li
            key={page.id}
            className={joinClasses(
              page.number === before && 'ml-3 border-l-4 border-dashed border-teal pl-5',
            )}
          >
            <button
              type="button"
              disabled={page.number === 1 || isBusy}
              aria-pressed={page.number === before}
              aria-label={`Second paper begins with page ${page.number}`}
              onClick={() => setBefore(page.number)}
              className={joinClasses(
                'flex w-20 flex-col items-center gap-1 rounded border-2 bg-paper p-1 text-xs tabular-nums',
                page.number === before ? 'border-teal' : 'border-line enabled:hover:border-teal',
              )}
            >
              <span className="flex h-24 items-center">
                <img src={pageThumbnailUrl(page.id)} alt="" className="max-h-24 max-w-full" />
              </span>
              {page.number}
            </button>
          </li>
        ))}
      </ol>
    </Dialog>
  );
}
