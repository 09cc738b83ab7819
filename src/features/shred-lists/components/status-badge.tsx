import { Badge, type BadgeTone } from '../../../components/ui/badge.tsx';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { statusWords } from '../logic/words.ts';

const tones: Record<ShredList['status'], BadgeTone> = {
  draft: 'neutral',
  sent: 'soon',
  approved: 'good',
  done: 'danger',
  void: 'neutral',
};

/** How far a list is, in two words. */
export function StatusBadge({ status }: { status: ShredList['status'] }) {
  return <Badge tone={tones[status]}>{statusWords[status]}</Badge>;
}
