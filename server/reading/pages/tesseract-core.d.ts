/** The part of the compiled engine's interface that the reader uses. */
interface TesseractCoreApi {
  Init(path: string | null, language: string, mode: number): number;
  SetVariable(name: string, value: string): boolean;
  /** 0 when the picture written to `/input` was understood. */
  SetImageFile(exif: number, angle: number): number;
  SetSourceResolution(dpi: number): void;
  Recognize(monitor: null): number;
  GetJSONText(): string;
  Clear(): void;
  End(): void;
}
interface TesseractCoreModule {
  FS: { writeFile(path: string, data: Uint8Array): void };
  TessBaseAPI: new () => TesseractCoreApi;
}
interface TesseractCoreOptions {
  TesseractProgress(percent: number): void;
  print(line: string): void;
  printErr(line: string): void;
}
declare module 'tesseract.js-core/tesseract-core-simd-lstm.js' {
  const load: (options: TesseractCoreOptions) => Promise<TesseractCoreModule>;
  export default load;
}
declare module 'tesseract.js-core/tesseract-core-lstm.js' {
  const load: (options: TesseractCoreOptions) => Promise<TesseractCoreModule>;
  export default load;
}
