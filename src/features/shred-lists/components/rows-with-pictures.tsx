import type { ReactNode } from 'react';
import { useState } from 'react';
import type { ShredRow } from '../../../../server/contract/shred-lists.ts';
import { PaperDialog } from './paper-dialog.tsx';
import { ShredRows } from './shred-rows.tsx';

interface RowsWithPicturesProps {
  rows: readonly ShredRow[];
  keepBack?: ReadonlySet<string>;
  renderControl?: (row: ShredRow) => ReactNode;
}

/** The rows, each opening its pages; what was opened is ticked. */
export function RowsWithPictures({ rows, keepBack, renderControl }: RowsWithPicturesProps) {
  const [opened, setOpened] = useState<string | null>(null);
  const [lookedAt, setLookedAt] = useState<ReadonlySet<string>>(new Set());
  return (
    <>
      <ShredRows
        rows={rows}
        lookedAt={lookedAt}
        onOpen={setOpened}
        {...(keepBack ? { keepBack } : {})}
        {...(renderControl ? { renderControl } : {})}
      />
      {opened ? (
        <PaperDialog
          rows={rows}
          paper={opened}
          onShow={setOpened}
          onLookedAt={(paper) => setLookedAt((before) => new Set([...before, paper]))}
          onClose={() => setOpened(null)}
          {...(renderControl ? { renderControl } : {})}
        />
      ) : null}
    </>
  );
}
