import { Undo2 } from 'lucide-react';
import type { ShredRow } from '../../../../server/contract/shred-lists.ts';
import { Button } from '../../../components/ui/button.tsx';

interface KeepBackButtonProps {
  row: Pick<ShredRow, 'paperNumber'>;
  isKept: boolean;
  onToggle: () => void;
}

/** Keeps one paper in the household, or lets it go after all; nothing is sent until consent is given. */
export function KeepBackButton({ row, isKept, onToggle }: KeepBackButtonProps) {
  return (
    <div className="flex flex-wrap items-center gap-3 md:flex-col md:items-end md:gap-1">
      {isKept ? <span className="font-semibold text-teal-strong">This one stays</span> : null}
      <Button
        size="small"
        aria-label={
          isKept ? `Let paper ${row.paperNumber} go after all` : `Keep paper ${row.paperNumber}`
        }
        {...(isKept ? { icon: <Undo2 aria-hidden /> } : {})}
        onClick={onToggle}
      >
        {isKept ? 'Let it go after all' : 'Keep this one'}
      </Button>
    </div>
  );
}
