/** How much of one file the reader is willing to take on. */
export interface ReadingLimits {
  /** Pages of one file. */
  maxPages: number;
  /** Pixels of one picture, as its header declares them. */
  maxPixels: number;
  /** Bytes of one file. */
  maxBytes: number;
  /** Time for one page, in milliseconds, before it is given up. */
  pageTimeoutMs: number;
  /** Memory that one page may take on top of what was in use, in megabytes, before it is given up. */
  pageMemoryMb: number;
}

export const defaultReadingLimits: ReadingLimits = {
  maxPages: 600,
  maxPixels: 130_000_000,
  maxBytes: 100 * 1024 * 1024,
  pageTimeoutMs: 90_000,
  pageMemoryMb: 1500,
};

/** The defaults with what the caller wants otherwise. */
export function withDefaultLimits(limits: Partial<ReadingLimits> = {}): ReadingLimits {
  return { ...defaultReadingLimits, ...limits };
}

/** The reading limits among an application's settings. */
export function readingLimitsOf(settings: {
  maxPages: number;
  maxPixels: number;
  maxFileBytes: number;
  pageTimeoutMs: number;
  readerMemoryMb: number;
}): ReadingLimits {
  return {
    maxPages: settings.maxPages,
    maxPixels: settings.maxPixels,
    maxBytes: settings.maxFileBytes,
    pageTimeoutMs: settings.pageTimeoutMs,
    pageMemoryMb: settings.readerMemoryMb,
  };
}
