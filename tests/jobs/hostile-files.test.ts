/**
 * Files somebody may send in by mistake or malice, each under every name of a bad list, through HTTP and the
 * worker: refused or read safely with a sentence that says what to do, and everything goes on afterwards.
 */
import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { BoxRecord } from '../../server/contract/boxes.ts';
import type { Paper, PaperRow } from '../../server/contract/papers.ts';
import type { Scan } from '../../server/contract/scans.ts';
import type { Visitor } from '../support/app.ts';
import { eventually } from '../support/eventually.ts';
import { addPractice, testPassword, type TestPractice } from '../support/people.ts';
import { composeUpload, openUpload, type RawAnswer, uploadRaw } from '../support/raw-upload.ts';
import { startWorkingApp, type WorkingApp } from '../support/working-app.ts';

const folder = 'tests/fixtures/hostile';
const { names } = JSON.parse(readFileSync(`${folder}/upload-names.json`, 'utf8')) as {
  names: string[];
};
const files = readdirSync(folder).filter((name) => name !== 'upload-names.json');
const load = (file: string) => readFileSync(path.join(folder, file));

/** What becomes of each: refused at the door, accepted and read, or accepted and failed with a reason. */
const fates: Record<string, 'refused' | 'read' | 'failed'> = {
  '2000-empty-pages.pdf': 'failed',
  'animated.gif': 'refused',
  'climbing-entry.zip': 'refused',
  'cmyk.jpg': 'read',
  'corrupt.tif': 'failed',
  'empty.pdf': 'refused',
  'encrypted-owner-only.pdf': 'read',
  'encrypted-user-password.pdf': 'failed',
  'entity.svg': 'refused',
  'giant-page.pdf': 'read',
  'gps-and-orientation.jpg': 'read',
  'huge-30000x30000-full.png': 'refused',
  'huge-30000x30000-short.png': 'refused',
  'javascript-and-launch.pdf': 'read',
  'one-pixel.png': 'refused',
  'page-tree-loop.pdf': 'failed',
  'phone.avif': 'read',
  'phone.heic': 'read',
  'picture.jpg': 'refused',
  'plain-bill.pdf': 'read',
  'polyglot.pdf': 'refused',
  'really-a-zip.pdf': 'refused',
  'script.svg': 'refused',
  'sixteen-bit.png': 'read',
  'stream-bomb.pdf': 'read',
  'transparent.png': 'read',
  'truncated.jpg': 'failed',
  'truncated.pdf': 'failed',
  'wide-strip.png': 'refused',
  'word-file.pdf': 'refused',
};

const place = mkdtempSync(path.join(os.tmpdir(), 'slackwater-hostile-'));
const uploadsDir = path.join(place, 'deep', 'down', 'uploads');
let app: WorkingApp;
let practice: TestPractice;
let owner: Visitor;
let boxId: string;

beforeAll(async () => {
  app = await startWorkingApp({ env: { UPLOADS_DIR: uploadsDir } });
  practice = await addPractice();
  owner = await app.signIn(practice.emails.owner, testPassword);
  boxId = await addBox(practice.householdId);
});
afterAll(async () => {
  await app.close();
  rmSync(place, { recursive: true, force: true });
});

async function addBox(householdId: string): Promise<string> {
  const box = await owner.post(`/api/households/${householdId}/boxes`, { label: 'Odd' });
  return (box.body as BoxRecord).id;
}

async function listScans(id: string): Promise<Scan[]> {
  return ((await owner.get(`/api/boxes/${id}/scans`)).body as { items: Scan[] }).items;
}

async function awaitRead(id: string): Promise<Scan[]> {
  return eventually(
    async () => {
      const scans = await listScans(id);
      return scans.every(({ status }) => status === 'read' || status === 'failed') && scans;
    },
    'everything read or failed',
    170_000,
  );
}

/** A sentence for people: begins with a capital, ends with a full stop, tells nothing of the inside. */
const sentence = /^[A-Z][^\n\0]{15,300}\.$/;
const inside = /stack|\.ts\b|\.mjs\b|Error:|undefined|null|node_modules|\bat \w+ \(/;

function checkAnswer({ status, body }: RawAnswer, sent: string): 'accepted' | 'refused' {
  const said = body.items ? (body.items[0]?.reason ?? null) : (body.detail ?? '');
  expect([sent, [202, 400, 422].includes(status)]).toEqual([sent, true]);
  if (said !== null) {
    expect([sent, said]).toEqual([sent, expect.stringMatching(sentence)]);
    expect(said).not.toMatch(inside);
  }
  const label = body.items?.[0]?.name ?? 'none';
  expect(label.length).toBeLessThanOrEqual(120);
  expect(label).not.toMatch(/[\p{Cc}\u200b-\u200f\u202a-\u202e/\\]/u);
  return body.items?.[0]?.accepted ? 'accepted' : 'refused';
}

/** Every file below the folder of uploads lies in a scan's folder of the household, under a name of the server's own. */
function findStrangeFiles(): string[] {
  const id = '[0-9a-f-]{36}';
  const known = new RegExp(
    `^deep/down/uploads/(${id}/${id}/(scan|\\d{4}-(image|thumbnail)\\.jpg))$`,
  );
  return readdirSync(place, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(place, path.join(entry.parentPath, entry.name)))
    .filter((file) => !known.test(file));
}

describe('hostile files', () => {
  test('all have a fate', () => {
    expect(Object.keys(fates).sort()).toEqual([...files].sort());
  });

  test('are refused or taken by what they hold, whatever name they come under', async () => {
    let cells = 0;
    const wrong: string[] = [];
    for (const file of files) {
      const expected = fates[file] === 'refused' ? 'refused' : 'accepted';
      for (const name of names) {
        const sent = `${file} as ${JSON.stringify(name)}`;
        const answer = await uploadRaw(app.url, owner, boxId, [{ name, bytes: load(file) }]);
        const outcome = checkAnswer(answer, sent);
        // A name that breaks the request itself loses the file, and says so.
        if (answer.status === 202 && outcome !== expected) wrong.push(`${sent}: ${outcome}`);
        cells += 1;
      }
    }
    process.stdout.write(
      `hostile: ${cells} uploads, ${files.length} files under ${names.length} names\n`,
    );
    expect(wrong).toEqual([]);
    expect(cells).toBe(files.length * names.length);
    expect(findStrangeFiles()).toEqual([]);
    expect((await owner.get('/api/health')).status).toBe(200);
  }, 120_000);

  test('are read by the worker, or fail with a sentence; it goes on working', async () => {
    await app.startWorker();
    const scans = await awaitRead(boxId);
    const accepted = files.filter((file) => fates[file] !== 'refused');
    expect(scans).toHaveLength(accepted.length);
    const bySize = new Map(accepted.map((file) => [load(file).length, file]));
    const outcomes = Object.fromEntries(
      scans.map(({ bytes, status }) => [bySize.get(bytes) ?? '', status]),
    );
    expect(outcomes).toEqual(Object.fromEntries(accepted.map((file) => [file, fates[file] ?? ''])));
    for (const { status, reason } of scans) {
      expect(reason).toEqual(status === 'read' ? null : expect.stringMatching(sentence));
      expect(reason ?? '').not.toMatch(inside);
    }
    expect(scans.find(({ bytes }) => bytes === load('encrypted-user-password.pdf').length)).toEqual(
      expect.objectContaining({ reason: expect.stringMatching(/password/) }),
    );
    expect(findStrangeFiles()).toEqual([]);
    expect((await owner.get('/api/health')).status).toBe(200);
  }, 180_000);

  test('leave pictures that are bright, upright, without a place or name, and of a fixed type', async () => {
    const found = await owner.get(`/api/households/${practice.householdId}/papers?pageSize=200`);
    const papers = await Promise.all(
      (found.body as { items: PaperRow[] }).items.map(
        async ({ id }) => (await owner.get(`/api/papers/${id}`)).body as Paper,
      ),
    );
    expect(papers.length).toBeGreaterThan(5);
    for (const { pages } of papers) {
      for (const page of pages) {
        const picture = await owner.get(`/api/pages/${page.id}/image`).buffer(true);
        expect(picture.headers).toMatchObject({
          'content-type': 'image/jpeg',
          'x-content-type-options': 'nosniff',
        });
        const { exif, xmp, iptc, orientation } = await sharp(picture.body as Buffer).metadata();
        expect([exif, xmp, iptc, orientation]).toEqual([
          undefined,
          undefined,
          undefined,
          undefined,
        ]);
        const { channels } = await sharp(picture.body as Buffer).stats();
        expect(channels[0]?.mean).toBeGreaterThan(120);
      }
    }
  });

  test('a sound file goes through under every name, and the name changes nothing', async () => {
    const bytes = load('plain-bill.pdf');
    const boxes: string[] = [];
    for (const [index, name] of names.entries()) {
      const made = await owner.post('/api/households', { name: `House ${index}`, country: 'GB' });
      const box = await addBox((made.body as { id: string }).id);
      const answer = await uploadRaw(app.url, owner, box, [{ name, bytes }]);
      checkAnswer(answer, JSON.stringify(name));
      if (answer.status === 202) boxes.push(box);
    }
    // An empty name, a NUL, a line break and a control character are no file name at all.
    expect(boxes).toHaveLength(names.length - 4);
    const texts = new Set<string>();
    for (const box of boxes) {
      const [scan] = await awaitRead(box);
      expect([scan?.status, scan?.papers]).toEqual(['read', 1]);
      const { householdId } = (await owner.get(`/api/boxes/${box}`)).body as BoxRecord;
      const { items } = (await owner.get(`/api/households/${householdId}/papers`)).body as {
        items: PaperRow[];
      };
      texts.add(((await owner.get(`/api/papers/${items[0]?.id}`)).body as Paper).text);
    }
    expect(texts.size).toBe(1);
    expect(findStrangeFiles()).toEqual([]);
  }, 120_000);
});

describe('an upload that is cut off', () => {
  test.each([0.02, 0.5, 0.98])('after %d of it leaves nothing half-stored', async (share) => {
    const box = await addBox(practice.householdId);
    const bytes = Buffer.alloc(400_000, 'x');
    load('plain-bill.pdf').copy(bytes);
    const body = composeUpload([
      { name: 'first.pdf', bytes: Buffer.concat([bytes, Buffer.from(String(share))]) },
      { name: 'second.pdf', bytes: Buffer.concat([bytes, Buffer.from(`${share}b`)]) },
    ]);
    const { request, answer } = openUpload(app.url, owner, box, body.length);
    const outcome = answer.catch((error: Error) => error.message);
    await new Promise((resolve) =>
      request.write(body.subarray(0, Math.floor(body.length * share)), resolve),
    );
    // The server has begun to receive before the line breaks.
    if (share > 0.1) await eventually(() => Promise.resolve(countIncoming() > 0), 'bytes arrived');
    request.destroy();
    expect(await outcome).toMatch(/hang up|ECONNRESET|aborted/);
    await eventually(() => Promise.resolve(countIncoming() === 0), 'the parts removed');
    expect(await listScans(box)).toEqual([]);
    expect(findStrangeFiles()).toEqual([]);
    expect((await owner.get('/api/health')).status).toBe(200);
  });

  function countIncoming(): number {
    return readdirSync(path.join(uploadsDir, '.incoming')).length;
  }
});
