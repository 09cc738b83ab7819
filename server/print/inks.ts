import { rgb } from 'pdf-lib';
import type { Color } from 'pdf-lib';

/** Few inks, all dark enough to be read from a grey printer. */
export const inks = {
  /** Deep slate: what is read. */
  slate: rgb(0.13, 0.2, 0.23),
  /** What explains. */
  quiet: rgb(0.35, 0.42, 0.45),
  /** Hairlines. */
  hairline: rgb(0.74, 0.78, 0.79),
  /** Grounds of panels. */
  mist: rgb(0.95, 0.965, 0.965),
  teal: rgb(0.04, 0.39, 0.39),
  amber: rgb(0.58, 0.36, 0.02),
  rust: rgb(0.62, 0.22, 0.1),
  white: rgb(1, 1, 1),
} as const satisfies Record<string, Color>;
export type Ink = keyof typeof inks;
