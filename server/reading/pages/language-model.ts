import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { gunzipSync } from 'node:zlib';
import path from 'node:path';

/** Where Debian's packages put their models; the small, fast kind. */
const systemFolders = [
  '/usr/share/tesseract-ocr/5/tessdata',
  '/usr/share/tesseract-ocr/4.00/tessdata',
  '/usr/share/tessdata',
];

export interface LanguageModel {
  data: Uint8Array;
  /** Which model it is, for the log at start. */
  name: 'fast' | 'best-int';
}

/**
 * The English model: the fast one from `folder` or from the system's package where it is installed,
 * else the one that ships with the npm packages. Nothing is fetched from anywhere.
 */
export async function loadLanguageModel(folder?: string): Promise<LanguageModel> {
  for (const place of folder ? [folder] : systemFolders) {
    const data = await readFile(path.join(place, 'eng.traineddata')).catch(() => null);
    if (data) return { data, name: 'fast' };
  }
  const require = createRequire(import.meta.url);
  const home = path.dirname(require.resolve('@tesseract.js-data/eng/package.json'));
  const packed = await readFile(path.join(home, '4.0.0_best_int', 'eng.traineddata.gz'));
  return { data: gunzipSync(packed), name: 'best-int' };
}
