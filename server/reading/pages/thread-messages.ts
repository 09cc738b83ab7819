/** What the main thread and the page threads say to each other. */
import type { ReadPage } from '../types.ts';
import type { ReadingLimits } from './limits.ts';
import type { FileKind } from './sniff.ts';

/** A file as handed to threads: its bytes are shared, not copied for each. */
export interface SharedFile {
  id: number;
  kind: FileKind;
  bytes: SharedArrayBuffer;
}

export type PageTask =
  { type: 'open'; file: SharedFile } | { type: 'read'; file: SharedFile; page: number };

export type TaskMessage = { type: 'task'; id: number; task: PageTask };
export type ThreadMessage = TaskMessage | { type: 'close'; fileId: number };

export type TaskResult = { type: 'opened'; pageCount: number } | { type: 'page'; page: ReadPage };

export type ThreadReply =
  | { type: 'ready'; model: 'fast' | 'best-int' }
  | { type: 'done'; id: number; result: TaskResult }
  /** `sentence` is for a person, `detail` for the log and null when nothing unforeseen happened. */
  | { type: 'failed'; id: number; sentence: string; detail: string | null };

export interface ThreadSettings {
  limits: ReadingLimits;
  modelFolder: string | null;
}
