/**
 * Receives uploaded files into a folder of parts, hashing on the way. A file over the limit is named and
 * skipped; the others of the same upload go on. Nothing of an upload that breaks off stays.
 */
import { createHash, randomUUID } from 'node:crypto';
import { createWriteStream, mkdirSync } from 'node:fs';
import { readdir, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import { Transform, type TransformCallback } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import multer, { type StorageEngine } from 'multer';

/** What stands in `request.files` for each received file. */
export interface ReceivedFile {
  /** The uploader's name made harmless: a label, never a path. */
  label: string;
  /** Where the bytes wait; null when the file was too large. */
  partPath: string | null;
  bytes: number;
  sha256: string;
}

declare module 'express-serve-static-core' {
  interface Request {
    receivedFiles?: ReceivedFile[];
  }
}

export function createUploadReceiver(
  uploadsDir: string,
  limits: { maxFileBytes: number; maxFiles: number },
) {
  const folder = path.join(uploadsDir, '.incoming');
  const engine: StorageEngine = {
    _handleFile(request, file, callback) {
      // Files are named in the order they came, whichever is written first.
      const entry: ReceivedFile = {
        label: cleanFileName(file.originalname),
        partPath: null,
        bytes: 0,
        sha256: '',
      };
      request.receivedFiles ??= [];
      request.receivedFiles.push(entry);
      receive(file.stream, folder, limits.maxFileBytes).then(
        (received) => {
          Object.assign(entry, received);
          callback(null, {});
        },
        (error: unknown) => callback(error),
      );
    },
    _removeFile(request, _file, callback) {
      discardReceived(request.receivedFiles ?? []).then(() => callback(null), callback);
    },
  };
  return multer({
    storage: engine,
    // Without it a name in UTF-8 arrives as Latin-1.
    defParamCharset: 'utf8',
    // Names arrive whole and are made harmless here: otherwise a file called ".." would be passed over.
    preservePath: true,
    limits: { files: limits.maxFiles, fields: 10, fieldSize: 1000, parts: limits.maxFiles + 10 },
  }).array('files');
}

/** Removes parts that were not taken over. */
export async function discardReceived(files: ReceivedFile[]): Promise<void> {
  await Promise.all(
    files.flatMap(({ partPath }) => (partPath ? [rm(partPath, { force: true })] : [])),
  );
}

/** Removes parts that an earlier, broken run left behind. */
export async function sweepIncoming(
  uploadsDir: string,
  olderThanMs: number,
  now: Date,
): Promise<void> {
  const folder = path.join(uploadsDir, '.incoming');
  for (const name of await readdir(folder).catch(() => [])) {
    const file = path.join(folder, name);
    const info = await stat(file).catch(() => null);
    if (info && now.getTime() - info.mtimeMs > olderThanMs) await rm(file, { force: true });
  }
}

async function receive(stream: NodeJS.ReadableStream, folder: string, maxBytes: number) {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const partPath = path.join(folder, randomUUID());
  const hash = createHash('sha256');
  let bytes = 0;
  const meter = new Transform({
    transform(chunk: Buffer, _encoding, done: TransformCallback) {
      bytes += chunk.length;
      if (bytes > maxBytes) return done();
      hash.update(chunk);
      done(null, chunk);
    },
  });
  try {
    await pipeline(stream, meter, createWriteStream(partPath, { mode: 0o600, flags: 'wx' }));
  } catch (error) {
    await rm(partPath, { force: true });
    throw error;
  }
  if (bytes > maxBytes) {
    await rm(partPath, { force: true });
    return { partPath: null, bytes, sha256: '' };
  }
  return { partPath, bytes, sha256: hash.digest('hex') };
}

/** Directions, controls and zero-width letters that could make a name read as something else. */
const deceptive = /[\p{Cc}\u200b-\u200f\u2028-\u202e\u2060-\u2069\ufeff]/gu;
const longestLabel = 120;

/** A file name as a label: the last part of a path, without controls, at most 120 characters. */
export function cleanFileName(name: string): string {
  const last =
    name
      .normalize('NFC')
      .replace(deceptive, ' ')
      .split(/[/\\]/)
      .filter((part) => part.trim())
      .at(-1) ?? '';
  const label = last.replace(/\s+/g, ' ').trim();
  if (!/[^.]/.test(label)) return 'Unnamed file';
  return label.length > longestLabel ? `${label.slice(0, longestLabel - 1)}…` : label;
}
