import { useCallback, useRef, useState } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { scanEndpoints } from '../../../../server/contract/scans.ts';
import { sentenceOf } from '../../../lib/api-error.ts';
import { uploadForm } from '../../../lib/upload-form.ts';

export type SendingState = 'waiting' | 'sending' | 'sent' | 'here-already' | 'refused' | 'failed';

export interface SentFile {
  key: number;
  file: File;
  state: SendingState;
  /** Share of its bytes sent, 0 to 1. */
  share: number;
  /** Why it was refused or did not arrive. */
  reason: string | null;
}

/** Files under way at once: a slow line is not cut into too many pieces. */
const lanes = 2;

/**
 * Sends files to a box, each in a request of its own, so that one that breaks off takes no other along.
 * What failed stays in the list and can be sent again; sending twice makes no second copy.
 */
export function useSending(boxId: string) {
  const queryClient = useQueryClient();
  const [files, setFiles] = useState<SentFile[]>([]);
  const waiting = useRef<SentFile[]>([]);
  const running = useRef(0);
  const lastKey = useRef(0);

  const change = useCallback((key: number, values: Partial<SentFile>) => {
    setFiles((all) => all.map((file) => (file.key === key ? { ...file, ...values } : file)));
  }, []);

  const sendOne = useCallback(
    async (entry: SentFile) => {
      change(entry.key, { state: 'sending', share: 0, reason: null });
      const form = new FormData();
      form.append('files', entry.file);
      try {
        const answer = await uploadForm(scanEndpoints.uploadScans, {
          params: { id: boxId },
          form,
          onProgress: (share) => change(entry.key, { share }),
        });
        const result = answer.items[0];
        change(entry.key, {
          share: 1,
          state: !result?.accepted ? 'refused' : result.alreadyHere ? 'here-already' : 'sent',
          reason: result?.reason ?? null,
        });
        void queryClient.invalidateQueries({ queryKey: ['boxes', boxId] });
      } catch (error) {
        change(entry.key, { state: 'failed', reason: sentenceOf(error) });
      }
    },
    [boxId, change, queryClient],
  );

  /** Sends one after the other until none waits. */
  const runLane = useCallback(async () => {
    running.current += 1;
    for (let next = waiting.current.shift(); next; next = waiting.current.shift()) {
      await sendOne(next);
    }
    running.current -= 1;
  }, [sendOne]);

  const work = useCallback(() => {
    const most = Math.min(lanes - running.current, waiting.current.length);
    for (let i = 0; i < most; i += 1) void runLane();
  }, [runLane]);

  const send = useCallback(
    (chosen: File[]) => {
      const entries = chosen.map((file): SentFile => {
        lastKey.current += 1;
        return { key: lastKey.current, file, state: 'waiting', share: 0, reason: null };
      });
      setFiles((all) => [...entries, ...all]);
      waiting.current.push(...entries);
      work();
    },
    [work],
  );

  const sendAgain = useCallback(
    (entry: SentFile) => {
      waiting.current.push(entry);
      change(entry.key, { state: 'waiting', share: 0, reason: null });
      work();
    },
    [change, work],
  );

  const clear = useCallback(() => {
    setFiles((all) => all.filter((f) => f.state === 'waiting' || f.state === 'sending'));
  }, []);

  return { files, send, sendAgain, clear };
}
