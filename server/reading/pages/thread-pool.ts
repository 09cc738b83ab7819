/** Threads that read pages: one queue for all files, a time limit for each task, fresh threads after a while. */
import { Worker } from 'node:worker_threads';
import type {
  PageTask,
  TaskResult,
  ThreadMessage,
  ThreadReply,
  ThreadSettings,
} from './thread-messages.ts';
import { UnreadableFileError } from './unreadable-file-error.ts';

/** The engine's memory never shrinks: a thread is replaced after this many tasks. */
const TASKS_PER_THREAD = 300;
/** How often the memory of a page under way is looked at. */
const MEMORY_LOOK_MS = 200;
const MEGABYTE = 1024 * 1024;

const tooMuchMemory = 'This page needed more memory than it may have. Scan it at 200 to 300 dpi.';
const tooMuchTime =
  'This page took too long to read and was given up. Scan it again, at 200 to 300 dpi.';

export interface ThreadPoolOptions extends ThreadSettings {
  threads: number;
  /** Told of faults that are not the file's: for the log. */
  onFault?: (detail: string) => void;
}

export interface ThreadPool {
  /** Carries out one task. Urgent ones go ahead of those that wait. */
  run(task: PageTask, urgent?: boolean): Promise<TaskResult>;
  /** Lets all threads forget a file. */
  forget(fileId: number): void;
  close(): Promise<void>;
}

interface Job {
  id: number;
  task: PageTask;
  resolve(result: TaskResult): void;
  reject(error: Error): void;
}

interface Thread {
  worker: Worker;
  job: Job | null;
  timer: NodeJS.Timeout | null;
  /** Looks at the memory of the task under way. */
  watch: NodeJS.Timeout | null;
  done: number;
}

/** Starts no thread before the first task. */
export function createThreadPool(options: ThreadPoolOptions): ThreadPool {
  const waiting: Job[] = [];
  const threads = new Set<Thread>();
  let lastId = 0;
  let closed = false;

  function startThread(): Thread {
    const worker = new Worker(new URL('./page-thread.mjs', import.meta.url), {
      workerData: { limits: options.limits, modelFolder: options.modelFolder },
      execArgv: [],
      resourceLimits: { maxOldGenerationSizeMb: options.limits.pageMemoryMb },
    });
    const thread: Thread = { worker, job: null, timer: null, watch: null, done: 0 };
    worker.on('message', (message: ThreadReply) => receive(thread, message));
    worker.on('error', (error) => lose(thread, error));
    worker.on('exit', () => lose(thread, null));
    threads.add(thread);
    return thread;
  }

  function receive(thread: Thread, message: ThreadReply): void {
    const { job } = thread;
    if (message.type === 'ready' || !job || message.id !== job.id) return;
    release(thread);
    thread.done++;
    if (message.type === 'done') job.resolve(message.result);
    else {
      if (message.detail !== null) options.onFault?.(message.detail);
      job.reject(new UnreadableFileError(message.sentence));
    }
    if (thread.done >= TASKS_PER_THREAD) endThread(thread);
    assign();
  }

  function release(thread: Thread): void {
    if (thread.timer) clearTimeout(thread.timer);
    if (thread.watch) clearInterval(thread.watch);
    thread.timer = null;
    thread.watch = null;
    thread.job = null;
  }

  function endThread(thread: Thread): void {
    threads.delete(thread);
    void thread.worker.terminate();
  }

  /** A thread that ended by itself takes its task with it; the next task gets a new thread. */
  function lose(thread: Thread, error: Error | null): void {
    const { job } = thread;
    release(thread);
    endThread(thread);
    if (job) {
      options.onFault?.(error?.stack ?? 'A page thread ended by itself.');
      job.reject(new UnreadableFileError(tooMuchMemory));
    }
    assign();
  }

  function giveUp(thread: Thread, sentence: string): void {
    const { job } = thread;
    release(thread);
    endThread(thread);
    job?.reject(new UnreadableFileError(sentence));
    assign();
  }

  /** The engine and the decoders take memory that no heap limit counts: what the process takes is looked at. */
  function watchMemory(thread: Thread): NodeJS.Timeout {
    const most = process.memoryUsage.rss() + options.limits.pageMemoryMb * MEGABYTE;
    return setInterval(() => {
      if (process.memoryUsage.rss() > most) giveUp(thread, tooMuchMemory);
    }, MEMORY_LOOK_MS);
  }

  function assign(): void {
    while (!closed && waiting.length > 0) {
      const thread = findFreeThread();
      const job = thread && waiting.shift();
      if (!thread || !job) return;
      thread.job = job;
      thread.timer = setTimeout(() => giveUp(thread, tooMuchTime), options.limits.pageTimeoutMs);
      thread.watch = watchMemory(thread);
      send(thread, { type: 'task', id: job.id, task: job.task });
    }
  }

  function findFreeThread(): Thread | null {
    for (const thread of threads) if (!thread.job) return thread;
    return threads.size < options.threads ? startThread() : null;
  }

  function send(thread: Thread, message: ThreadMessage): void {
    thread.worker.postMessage(message);
  }

  return {
    run(task, urgent = false) {
      if (closed) return Promise.reject(new Error('The reader is closed.'));
      return new Promise((resolve, reject) => {
        const job = { id: ++lastId, task, resolve, reject };
        if (urgent) waiting.unshift(job);
        else waiting.push(job);
        assign();
      });
    },
    forget(fileId) {
      for (const thread of threads) send(thread, { type: 'close', fileId });
    },
    async close() {
      closed = true;
      for (const job of waiting.splice(0)) job.reject(new Error('The reader was closed.'));
      const ending = [...threads];
      threads.clear();
      for (const thread of ending) {
        thread.job?.reject(new Error('The reader was closed.'));
        release(thread);
      }
      await Promise.all(ending.map((thread) => thread.worker.terminate()));
    },
  };
}
