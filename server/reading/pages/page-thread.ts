/** Body of a page thread: opens files, decodes, prepares and reads one page at a time. */
import { parentPort, workerData } from 'node:worker_threads';
import sharp from 'sharp';
import { startEngine, type Engine } from './engine.ts';
import { loadLanguageModel } from './language-model.ts';
import { openSource, type PageSource } from './page-source.ts';
import { readPage } from './read-page.ts';
import type {
  PageTask,
  SharedFile,
  TaskResult,
  ThreadMessage,
  ThreadReply,
  ThreadSettings,
} from './thread-messages.ts';
import { describeReadingError, UnreadableFileError } from './unreadable-file-error.ts';

/** Files kept open in this thread; a pile's pages come one after another. */
const MAX_OPEN_FILES = 3;

const port = parentPort;
if (!port) throw new Error('The page thread must be started as a thread.');
const { limits, modelFolder } = workerData as ThreadSettings;
sharp.concurrency(1);
sharp.cache(false);

const openFiles = new Map<number, PageSource>();
let engine: Engine | null = null;

async function requireSource(file: SharedFile): Promise<PageSource> {
  const known = openFiles.get(file.id);
  if (known) return known;
  const bytes = new Uint8Array(file.bytes.byteLength);
  bytes.set(new Uint8Array(file.bytes));
  const source = await openSource(bytes, file.kind, limits);
  openFiles.set(file.id, source);
  for (const id of openFiles.keys()) {
    if (openFiles.size <= MAX_OPEN_FILES) break;
    await closeFile(id);
  }
  return source;
}

async function closeFile(id: number): Promise<void> {
  const source = openFiles.get(id);
  openFiles.delete(id);
  await source?.close();
}

async function carryOut(task: PageTask): Promise<TaskResult> {
  const source = await requireSource(task.file);
  if (task.type === 'open') return { type: 'opened', pageCount: source.pageCount };
  engine ??= await startEngine(await loadLanguageModel(modelFolder ?? undefined));
  const raw = await source.loadPage(task.page);
  return { type: 'page', page: await readPage(raw, task.page, engine) };
}

function reply(message: ThreadReply): void {
  port?.postMessage(message);
}

port.on('message', (message: ThreadMessage) => {
  if (message.type === 'close') {
    void closeFile(message.fileId);
    return;
  }
  carryOut(message.task).then(
    (result) => reply({ type: 'done', id: message.id, result }),
    (error: unknown) =>
      reply({
        type: 'failed',
        id: message.id,
        sentence: describeReadingError(error),
        detail:
          error instanceof UnreadableFileError
            ? null
            : error instanceof Error
              ? (error.stack ?? error.message)
              : String(error),
      }),
  );
});
