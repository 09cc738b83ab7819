import { Badge, type BadgeTone } from '../../../components/ui/badge.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { formatBytes, formatCount } from '../../../lib/format.ts';
import type { SendingState, SentFile } from '../logic/use-sending.ts';
import { ProgressBar } from './progress-bar.tsx';

const words: Record<SendingState, string> = {
  waiting: 'waiting',
  sending: 'sending',
  sent: 'sent',
  'here-already': 'here already',
  refused: 'not taken',
  failed: 'not sent',
};
const tones: Record<SendingState, BadgeTone> = {
  waiting: 'neutral',
  sending: 'neutral',
  sent: 'good',
  'here-already': 'neutral',
  refused: 'danger',
  failed: 'danger',
};

/** How far each file got on its way to the server. */
export function SendingList({
  files,
  onAgain,
  onClear,
}: {
  files: SentFile[];
  onAgain: (file: SentFile) => void;
  onClear: () => void;
}) {
  if (files.length === 0) return null;
  const open = files.filter((f) => f.state === 'waiting' || f.state === 'sending').length;
  return (
    <section aria-label="Sending" className="mt-6">
      <div className="mb-2 flex flex-wrap items-center justify-between gap-3">
        <p aria-live="polite" className="font-semibold">
          {open > 0
            ? `Sending ${formatCount(open, 'file')}. You can go on meanwhile.`
            : 'All files are through.'}
        </p>
        {open === 0 ? (
          <Button size="small" onClick={onClear}>
            Clear this list
          </Button>
        ) : null}
      </div>
      <ul className="divide-y divide-line rounded-lg border border-line bg-paper-raised">
        {files.map((entry) => (
          <li key={entry.key} className="flex flex-wrap items-center gap-x-4 gap-y-1 px-4 py-2.5">
            <span className="min-w-0 flex-1 basis-52 truncate">{entry.file.name}</span>
            <span className="text-sm text-ink-soft tabular-nums">
              {formatBytes(entry.file.size)}
            </span>
            {entry.state === 'sending' ? (
              <ProgressBar label={`Sending ${entry.file.name}`} share={entry.share} />
            ) : (
              <Badge tone={tones[entry.state]}>{words[entry.state]}</Badge>
            )}
            {entry.state === 'failed' ? (
              <Button size="small" onClick={() => onAgain(entry)}>
                Send again
              </Button>
            ) : null}
            {entry.reason ? (
              <p className="basis-full text-sm text-ink-soft">{entry.reason}</p>
            ) : null}
          </li>
        ))}
      </ul>
    </section>
  );
}
