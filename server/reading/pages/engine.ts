/** The recognition engine: WebAssembly in this thread, no network, no files written. */
import type { LanguageModel } from './language-model.ts';
import type { Grey } from './raster.ts';
import { UnreadableFileError } from './unreadable-file-error.ts';

/** How the page is laid out: columns and tables, one block of even lines, or words anywhere. */
export type PageLayout = 'page' | 'block' | 'scattered';

const layoutModes: Record<PageLayout, string> = { page: '3', block: '6', scattered: '11' };

/** A word in pixels of the picture that was given. */
export interface SeenWord {
  text: string;
  left: number;
  top: number;
  width: number;
  height: number;
  /** 0 to 1. */
  confidence: number;
  /** Words of one line, as the engine saw it, share this. */
  line: string;
}

export interface Engine {
  recognise(grey: Grey, layout: PageLayout, dpi?: number): SeenWord[];
}

async function loadCore(): Promise<TesseractCoreModule> {
  const options = { TesseractProgress() {}, print() {}, printErr() {} };
  try {
    const { default: load } = await import('tesseract.js-core/tesseract-core-simd-lstm.js');
    return await load(options);
  } catch {
    const { default: load } = await import('tesseract.js-core/tesseract-core-lstm.js');
    return await load(options);
  }
}

/** Starts the engine with a model; about 0.15 s and 60 MB. Throws when the model is damaged. */
export async function startEngine(model: LanguageModel): Promise<Engine> {
  const core = await loadCore();
  core.FS.writeFile('eng.traineddata', model.data);
  const api = new core.TessBaseAPI();
  if (api.Init(null, 'eng', 1) !== 0) {
    throw new Error('The language model for reading could not be loaded. Install it again.');
  }
  return {
    recognise(grey, layout, dpi = 200) {
      const header = Buffer.from(`P5\n${grey.width} ${grey.height}\n255\n`, 'latin1');
      const file = new Uint8Array(header.length + grey.data.length);
      file.set(header, 0);
      file.set(grey.data, header.length);
      core.FS.writeFile('/input', file);
      if (api.SetImageFile(1, 0) !== 0) {
        throw new UnreadableFileError(
          'This page could not be turned into a picture. Scan it again.',
        );
      }
      api.SetVariable('tessedit_pageseg_mode', layoutModes[layout]);
      api.SetSourceResolution(dpi);
      api.Recognize(null);
      return parseWords(api.GetTSVText(0));
    },
  };
}

/** Words of the engine's tab-separated answer (columns: level, page, block, par, line, word, box, confidence, text). */
function parseWords(tsv: string): SeenWord[] {
  const words: SeenWord[] = [];
  for (const row of tsv.split('\n')) {
    const cells = row.split('\t');
    if (cells[0] !== '5') continue;
    const text = (cells[11] ?? '').trim();
    if (text === '') continue;
    words.push({
      text,
      left: Number(cells[6]),
      top: Number(cells[7]),
      width: Number(cells[8]),
      height: Number(cells[9]),
      confidence: Math.max(0, Math.min(1, Number(cells[10]) / 100)),
      line: `${cells[2]}.${cells[3]}.${cells[4]}`,
    });
  }
  return words;
}
