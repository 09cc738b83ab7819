/**
 * Scans and page pictures on disk, under ids that the server made. The uploader's file name never
 * touches the file system.
 */
import { randomUUID } from 'node:crypto';
import { mkdir, open, readdir, readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import path from 'node:path';

export interface ScanStorage {
  /** Stores the bytes of a scan for good; a crash leaves either nothing or all of it. */
  writeScan(householdId: string, scanId: string, bytes: Uint8Array): Promise<void>;
  readScan(householdId: string, scanId: string): Promise<Buffer>;
  removeScan(householdId: string, scanId: string): Promise<void>;
  writePicture(
    householdId: string,
    scanId: string,
    page: number,
    kind: PictureKind,
    bytes: Uint8Array,
  ): Promise<void>;
  /** Null when there is no such picture. */
  readPicture(
    householdId: string,
    scanId: string,
    page: number,
    kind: PictureKind,
  ): Promise<Buffer | null>;
  /** What a process that was killed may have left: scans nobody recorded, half-written pictures. */
  findLeftovers(writtenBefore: Date): Promise<Leftovers>;
  removePart(part: string): Promise<void>;
  /** Whether the folder can be written to. */
  check(): Promise<boolean>;
}

export interface Leftovers {
  /** Scans that have a folder; those without a record are leftovers. */
  scans: { householdId: string; scanId: string }[];
  /** Files that were never finished. */
  parts: string[];
}

export type PictureKind = 'image' | 'thumbnail';

const idPattern = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

/** Files under `folder/<household>/<scan>/`: `scan`, `0001-image.jpg`, `0001-thumbnail.jpg`. */
export function openScanStorage(folder: string): ScanStorage {
  const folderOf = (householdId: string, scanId: string) => {
    if (!idPattern.test(householdId) || !idPattern.test(scanId)) {
      throw new RangeError('Scans are stored under ids made by the server.');
    }
    return path.join(folder, householdId, scanId);
  };
  const pictureName = (page: number, kind: PictureKind) =>
    `${String(page).padStart(4, '0')}-${kind}.jpg`;

  return {
    async writeScan(householdId, scanId, bytes) {
      await writeWhole(path.join(folderOf(householdId, scanId), 'scan'), bytes);
    },
    readScan: (householdId, scanId) => readFile(path.join(folderOf(householdId, scanId), 'scan')),
    async removeScan(householdId, scanId) {
      await rm(folderOf(householdId, scanId), { recursive: true, force: true });
    },
    async writePicture(householdId, scanId, page, kind, bytes) {
      await writeWhole(path.join(folderOf(householdId, scanId), pictureName(page, kind)), bytes);
    },
    async readPicture(householdId, scanId, page, kind) {
      try {
        return await readFile(path.join(folderOf(householdId, scanId), pictureName(page, kind)));
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    async findLeftovers(writtenBefore) {
      const found: Leftovers = { scans: [], parts: [] };
      for (const householdId of await listFolder(folder)) {
        if (!idPattern.test(householdId)) continue;
        for (const scanId of await listFolder(path.join(folder, householdId))) {
          if (!idPattern.test(scanId)) continue;
          const scanFolder = folderOf(householdId, scanId);
          if (await isOlder(scanFolder, writtenBefore)) found.scans.push({ householdId, scanId });
          for (const name of await listFolder(scanFolder)) {
            const file = path.join(scanFolder, name);
            if (name.endsWith('.part') && (await isOlder(file, writtenBefore))) {
              found.parts.push(file);
            }
          }
        }
      }
      return found;
    },
    removePart: (part) => rm(part, { force: true }),
    async check() {
      try {
        await mkdir(folder, { recursive: true });
        // Several may ask at once: each writes a file of its own.
        const probe = path.join(folder, `.probe-${randomUUID()}`);
        await writeFile(probe, '');
        await rm(probe);
        return (await stat(folder)).isDirectory();
      } catch {
        return false;
      }
    },
  };
}

function listFolder(folder: string): Promise<string[]> {
  return readdir(folder).catch(() => []);
}

async function isOlder(file: string, instant: Date): Promise<boolean> {
  const info = await stat(file).catch(() => null);
  return info !== null && info.mtimeMs < instant.getTime();
}

/** Writes beside the target, flushes, then renames: readers never meet half a file. */
async function writeWhole(target: string, bytes: Uint8Array): Promise<void> {
  await mkdir(path.dirname(target), { recursive: true, mode: 0o700 });
  const part = `${target}.${randomUUID()}.part`;
  try {
    const file = await open(part, 'w', 0o600);
    try {
      await file.writeFile(bytes);
      await file.sync();
    } finally {
      await file.close();
    }
    await rename(part, target);
  } catch (error) {
    await rm(part, { force: true });
    throw error;
  }
}

function isMissing(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ENOENT';
}
