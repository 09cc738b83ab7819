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
  symbols: SeenSymbol[];
}

/** A letter and where it stands across the picture. */
export interface SeenSymbol {
  text: string;
  left: number;
  right: number;
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
      return parseWords(api.GetJSONText());
    },
  };
}

interface EngineBox {
  x0: number;
  y0: number;
  x1: number;
  y1: number;
}
interface EngineWord {
  text: string;
  confidence: number;
  bbox: EngineBox;
  symbols: { text: string; bbox: EngineBox }[];
}
interface EnginePage {
  blocks?: { paragraphs?: { lines: { words: EngineWord[] }[] }[] }[] | null;
}

/** Words of the engine's JSON answer. */
function parseWords(json: string): SeenWord[] {
  const words: SeenWord[] = [];
  const page = JSON.parse(json) as EnginePage;
  let lineCount = 0;
  for (const block of page.blocks ?? []) {
    for (const paragraph of block.paragraphs ?? []) {
      for (const line of paragraph.lines) {
        const name = String(++lineCount);
        for (const word of line.words) {
          const text = word.text.trim();
          if (text !== '') words.push(describeWord(word, text, name));
        }
      }
    }
  }
  return words;
}

function describeWord(word: EngineWord, text: string, line: string): SeenWord {
  const { x0, y0, x1, y1 } = word.bbox;
  return {
    text,
    left: x0,
    top: y0,
    width: x1 - x0,
    height: y1 - y0,
    confidence: Math.max(0, Math.min(1, word.confidence / 100)),
    line,
    symbols: word.symbols.map(({ text: letter, bbox }) => ({
      text: letter,
      left: bbox.x0,
      right: bbox.x1,
    })),
  };
}
