/** The optional, faster model for reading print that Debian ships. */
import { existsSync } from 'node:fs';
import { installDebianPackages } from './debian.mjs';

const places = [
  '/usr/share/tesseract-ocr/5/tessdata/eng.traineddata',
  '/usr/share/tesseract-ocr/4.00/tessdata/eng.traineddata',
  '/usr/share/tessdata/eng.traineddata',
];

/** @returns {string | null} the file of the distribution's model */
export function findReadingModel() {
  return places.find((place) => existsSync(place)) ?? null;
}

/**
 * Says which model reads the pages; tries once to install the distribution's.
 * @param {boolean} hasAsked whether that was tried before
 * @param {(line: string) => void} say
 */
export async function prepareReadingModel(hasAsked, say) {
  if (!findReadingModel() && !hasAsked) await installDebianPackages(['tesseract-ocr-eng'], say);
  const model = findReadingModel();
  say(
    model
      ? `Pages are read with Debian's model (${model}).`
      : 'Pages are read with the packaged model, which is slower; Debian’s tesseract-ocr-eng is faster.',
  );
}
