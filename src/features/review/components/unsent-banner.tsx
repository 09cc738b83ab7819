import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { formatCount } from '../../../lib/format.ts';
import type { OutboxEntry, OutboxSnapshot } from '../logic/outbox.ts';

interface UnsentBannerProps {
  snapshot: OutboxSnapshot;
  onRetry: () => void;
  onSettle: (entry: OutboxEntry) => void;
  onLook: (entry: OutboxEntry) => void;
  onDrop: (entry: OutboxEntry) => void;
}

/** What has not reached the server: waiting for the line, or in need of a person. */
export function UnsentBanner({ snapshot, onRetry, onSettle, onLook, onDrop }: UnsentBannerProps) {
  const conflict = snapshot.entries.find(({ state }) => state === 'conflict');
  const refused = snapshot.entries.find(({ state }) => state === 'refused');
  const waiting = snapshot.entries.filter(
    ({ state }) => state === 'waiting' || state === 'sending',
  );
  return (
    <div className="space-y-2 empty:hidden">
      {conflict && (
        <Banner
          alert
          title="Somebody else changed the same paper"
          action={
            <Button size="small" onClick={() => onSettle(conflict)}>
              Compare and choose
            </Button>
          }
        >
          {conflict.label}
        </Banner>
      )}
      {refused && (
        <Banner
          alert
          tone="soon"
          title={`Not saved. ${refused.label}`}
          action={
            <span className="flex gap-2">
              <Button size="small" onClick={() => onDrop(refused)}>
                Drop it
              </Button>
              <Button size="small" onClick={() => onLook(refused)}>
                Look at the paper
              </Button>
            </span>
          }
        >
          {refused.reason}
        </Banner>
      )}
      {snapshot.isOffline && waiting.length > 0 && (
        <Banner
          title={`No connection. ${formatCount(waiting.length, 'decision')} not sent yet`}
          action={
            <Button size="small" onClick={onRetry}>
              Try now
            </Button>
          }
        >
          Go on: they are kept in this window and sent as soon as the connection is back.
        </Banner>
      )}
    </div>
  );
}
