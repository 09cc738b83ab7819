/** From a file's bytes to the text and pictures of its pages, page by page. */
import type { ReadingLimits } from './pages/limits.ts';
import { withDefaultLimits } from './pages/limits.ts';
import type { FileKind } from './pages/sniff.ts';
import { sniffFile } from './pages/sniff.ts';
import type { SharedFile } from './pages/thread-messages.ts';
import { createThreadPool } from './pages/thread-pool.ts';
import { UnreadableFileError } from './pages/unreadable-file-error.ts';
import type { ReadPage } from './types.ts';

export interface PageReaderOptions {
  /** Pages read at the same time. */
  workers?: number;
  limits?: Partial<ReadingLimits>;
  /** Folder with `eng.traineddata`; by default the system's, else the one that ships with the packages. */
  modelFolder?: string;
  /** Told of faults that are not the file's, for the log. */
  onFault?: (detail: string) => void;
}

/** A file being read. Pages may be asked for in any order, several at once, and again after a restart. */
export interface OpenFile {
  kind: FileKind;
  pageCount: number;
  /** Reads page `number` from 1; urgent pages go first. Throws `UnreadableFileError`. */
  readPage(number: number, urgent?: boolean): Promise<ReadPage>;
  close(): void;
}

export interface PageReader {
  /** Opens a file by its content. Throws `UnreadableFileError` with a sentence for the person. */
  open(bytes: Uint8Array): Promise<OpenFile>;
  close(): Promise<void>;
}

/** A reader with its own threads; close it when done. Threads start with the first file. */
export function createPageReader(options: PageReaderOptions = {}): PageReader {
  const limits = withDefaultLimits(options.limits);
  const pool = createThreadPool({
    threads: Math.max(1, options.workers ?? 2),
    limits,
    modelFolder: options.modelFolder ?? null,
    ...(options.onFault ? { onFault: options.onFault } : {}),
  });
  let lastFile = 0;
  return {
    async open(bytes) {
      const sniffed = await sniffFile(bytes, limits);
      if ('refused' in sniffed) throw new UnreadableFileError(sniffed.refused);
      const file = shareFile(++lastFile, sniffed.kind, bytes);
      const opened = await pool.run({ type: 'open', file }, true);
      if (opened.type !== 'opened') throw new Error('The reader answered out of turn.');
      const { pageCount } = opened;
      return {
        kind: file.kind,
        pageCount,
        async readPage(number, urgent) {
          if (!Number.isInteger(number) || number < 1 || number > pageCount) {
            throw new RangeError(`The file has pages 1 to ${pageCount}, not ${number}.`);
          }
          const result = await pool.run({ type: 'read', file, page: number }, urgent);
          if (result.type !== 'page') throw new Error('The reader answered out of turn.');
          return restoreBuffers(result.page);
        },
        close: () => pool.forget(file.id),
      };
    },
    close: () => pool.close(),
  };
}

function shareFile(id: number, kind: FileKind, bytes: Uint8Array): SharedFile {
  const shared = new SharedArrayBuffer(bytes.byteLength);
  new Uint8Array(shared).set(bytes);
  return { id, kind, bytes: shared };
}

/** Buffers arrive from a thread as plain byte arrays. */
function restoreBuffers(page: ReadPage): ReadPage {
  const toBuffer = (bytes: Uint8Array) =>
    Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  return { ...page, image: toBuffer(page.image), thumbnail: toBuffer(page.thumbnail) };
}
