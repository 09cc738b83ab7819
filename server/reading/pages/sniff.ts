/** What a file is by its content, whatever its name says, and whether it can be taken on at all. */
import { fileTypeFromBuffer } from 'file-type';
import sharp from 'sharp';
import type { ReadingLimits } from './limits.ts';
import { withDefaultLimits } from './limits.ts';

export const fileKinds = ['pdf', 'jpeg', 'png', 'tiff', 'webp', 'heic', 'avif'] as const;
export type FileKind = (typeof fileKinds)[number];

/** The kind of a file the reader takes, or the sentence that tells why it does not. */
export type SniffResult = { kind: FileKind } | { refused: string };

const takes = 'Bring a PDF, or a JPEG, PNG, TIFF, WebP, HEIC or AVIF picture.';

const kindsByMime: Record<string, FileKind> = {
  'application/pdf': 'pdf',
  'image/jpeg': 'jpeg',
  'image/png': 'png',
  'image/apng': 'png',
  'image/tiff': 'tiff',
  'image/webp': 'webp',
  'image/heic': 'heic',
  'image/heif': 'heic',
  'image/heic-sequence': 'heic',
  'image/heif-sequence': 'heic',
  'image/avif': 'avif',
};

/** Shortest side in pixels on which print could stand. */
const MIN_SIDE = 40;
/** Longest side that decoders handle safely. */
const MAX_SIDE = 30_000;

/**
 * Tells the kind of a file from its bytes and checks what its header declares (bytes, pixels) before
 * anything is decoded. Never throws for a bad file: the answer is `{refused}` with a sentence.
 */
export async function sniffFile(
  bytes: Uint8Array,
  limits?: Partial<ReadingLimits>,
): Promise<SniffResult> {
  const { maxBytes, maxPixels } = withDefaultLimits(limits);
  if (bytes.length === 0) return { refused: 'The file is empty. Scan or save it again.' };
  if (bytes.length > maxBytes) {
    return {
      refused: `The file is larger than ${Math.floor(maxBytes / 1024 / 1024)} MB. Split it or scan at 200 to 300 dpi.`,
    };
  }
  const kind = await findKind(bytes);
  if (typeof kind !== 'string') return kind;
  if (kind === 'pdf') return { kind };
  return checkHeader(bytes, kind, maxPixels);
}

async function findKind(bytes: Uint8Array): Promise<FileKind | { refused: string }> {
  const head = Buffer.from(bytes.subarray(0, 1024)).toString('latin1');
  if (/^[\s\0\u00ef\u00bb\u00bf]*%PDF-/.test(head)) return 'pdf';
  const type = await fileTypeFromBuffer(bytes).catch(() => undefined);
  const kind = type && type.mime !== 'application/pdf' ? kindsByMime[type.mime] : undefined;
  if (kind) return kind;
  return { refused: describeForeign(head, type?.mime ?? '') };
}

function describeForeign(head: string, mime: string): string {
  if (/<svg[\s>]|<!DOCTYPE svg/i.test(head)) return `This is an SVG drawing, not a scan. ${takes}`;
  if (/<(!DOCTYPE html|html|script|body|head)[\s>]/i.test(head)) {
    return `This is a web page, whatever its name says. ${takes}`;
  }
  if (mime === 'image/gif') return `GIF pictures are not read. ${takes}`;
  if (/zip|rar|7z|tar|gzip|compressed/.test(mime)) {
    return 'This is an archive of files. Unpack it and bring the files in it one by one.';
  }
  if (/officedocument|msword|x-cfb|opendocument|rtf|excel|powerpoint/.test(mime)) {
    return 'This is an office document. Save it as PDF and bring that.';
  }
  if (mime.startsWith('image/')) return `This kind of picture is not read. ${takes}`;
  return `This file is not a scan, whatever its name says. ${takes}`;
}

async function checkHeader(
  bytes: Uint8Array,
  kind: FileKind,
  maxPixels: number,
): Promise<SniffResult> {
  const size = await sharp(bytes, { limitInputPixels: false, failOn: 'none' })
    .metadata()
    .catch(() => null);
  if (!size?.width || !size.height) {
    return { refused: 'The picture is damaged and cannot be opened. Scan or save it again.' };
  }
  const { width, height } = size;
  if (Math.min(width, height) < MIN_SIDE) {
    return {
      refused: `The picture is ${width} by ${height} pixels: too small to hold print. Scan it again.`,
    };
  }
  if (Math.max(width, height) > MAX_SIDE || width * height > maxPixels) {
    return {
      refused: `The picture is ${width} by ${height} pixels: too large. Scan it at 200 to 300 dpi.`,
    };
  }
  return { kind };
}
