/** Limits on bytes, files, pages, pixels, time and memory come from the settings and end in a sentence. */
import { readFile } from 'node:fs/promises';
import { afterEach, describe, expect, test } from 'vitest';
import type { BoxRecord } from '../../server/contract/boxes.ts';
import type { Scan, UploadResult } from '../../server/contract/scans.ts';
import type { Visitor } from '../support/app.ts';
import { eventually } from '../support/eventually.ts';
import { addPractice, testPassword } from '../support/people.ts';
import { startWorkingApp, type WorkingApp } from '../support/working-app.ts';

const demo = 'tests/fixtures/demo';
const photo = `${demo}/pennelow/IMG_090.jpg`;
const twoPages = `${demo}/pennelow/scan-058.pdf`;
const onePage = `${demo}/tarrow/download-072.pdf`;

let app: WorkingApp | null = null;
afterEach(async () => {
  await app?.close();
  app = null;
});

interface Bench {
  send(...files: string[]): Promise<{ status: number; detail: string; items: UploadResult[] }>;
  /** The scans after the worker is done with them, in the order of their names. */
  read(): Promise<Scan[]>;
}

async function open(env: Record<string, string>): Promise<Bench> {
  const started = await startWorkingApp({ env });
  app = started;
  const practice = await addPractice();
  const owner: Visitor = await started.signIn(practice.emails.owner, testPassword);
  const made = await owner.post(`/api/households/${practice.householdId}/boxes`, {});
  const url = `/api/boxes/${(made.body as BoxRecord).id}/scans`;
  return {
    async send(...files) {
      const request = owner.agent.post(url).set('X-CSRF-Token', owner.csrfToken);
      for (const file of files) {
        void request.attach('files', await readFile(file), file.split('/').at(-1) ?? '');
      }
      const { status, body } = await request;
      const { items = [], detail = '' } = body as { items?: UploadResult[]; detail?: string };
      return { status, detail, items };
    },
    async read() {
      await started.startWorker();
      return eventually(async () => {
        const { items } = (await owner.get(url)).body as { items: Scan[] };
        const isDone = items.every(({ status }) => status === 'read' || status === 'failed');
        return isDone && items.sort((a, b) => a.name.localeCompare(b.name));
      }, 'everything read or failed');
    },
  };
}

describe('the limit on', () => {
  test('bytes refuses one file by name and takes the others', async () => {
    const bench = await open({ MAX_FILE_BYTES: '100000' });
    const { status, items } = await bench.send(photo, onePage);
    expect(status).toBe(202);
    expect(items.map(({ name, accepted }) => [name, accepted])).toEqual([
      ['IMG_090.jpg', false],
      ['download-072.pdf', true],
    ]);
    expect(items[0]?.reason).toMatch(/larger than .*\.$/);
  });

  test('files refuses the request with a sentence', async () => {
    const bench = await open({ MAX_FILES: '1' });
    const { status, detail } = await bench.send(onePage, twoPages);
    expect([status, detail]).toEqual([400, expect.stringMatching(/fewer at a time\.$/)]);
    expect((await bench.send(onePage)).status).toBe(202);
  });

  test('pixels refuses from the header', async () => {
    const bench = await open({ MAX_PIXELS: '1000000' });
    const { items } = await bench.send(photo);
    expect(items[0]?.reason).toMatch(/too large\. Scan it at/);
  });

  test('pages fails the file and leaves the others', async () => {
    const bench = await open({ MAX_PAGES: '1' });
    await bench.send(twoPages, onePage);
    const scans = await bench.read();
    expect(scans.map(({ status }) => status)).toEqual(['read', 'failed']);
    expect(scans[1]?.reason).toMatch(/pages.*\.$/);
  });

  test('time gives a page up', async () => {
    const bench = await open({ PAGE_TIMEOUT_MS: '1000' });
    await bench.send(photo);
    const [scan] = await bench.read();
    expect([scan?.status, scan?.reason]).toEqual([
      'failed',
      expect.stringMatching(/took too long.*\.$/),
    ]);
  });

  test('memory gives a page up, and the worker goes on', async () => {
    const bench = await open({ READER_MEMORY_MB: '64' });
    await bench.send(photo);
    const [scan] = await bench.read();
    expect([scan?.status, scan?.reason]).toEqual([
      'failed',
      expect.stringMatching(/more memory.*\.$/),
    ]);
    await bench.send(onePage);
    expect(await bench.read()).toHaveLength(2);
  });
});
