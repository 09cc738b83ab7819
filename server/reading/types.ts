/**
 * The types between the stages of the reader. Each stage has one input and one output type:
 * file -> page images (decode) -> clean upright pages (prepare) -> page text (recognise) ->
 * papers (split) -> facts (facts) -> ranked classes (classify).
 */
import type { Candidate, Facts, Word } from '../contract/readings.ts';

/** One line of print: its words from left to right, lines from top to bottom. */
export interface TextLine {
  words: Word[];
}

/** The text of one upright page, with places. */
export interface PageText {
  /** Number of the page within its file, from 1. */
  number: number;
  lines: TextLine[];
  /** Lines joined by newlines, words by single spaces. */
  text: string;
  source: 'text-layer' | 'ocr' | 'none';
  /** 0 to 1, mean over words; 0 for a blank page. */
  confidence: number;
  blank: boolean;
  /** A separator sheet's code, or another QR code on the page. */
  code: string | null;
}

/** A page as stored: text and the upright picture that people look at. */
export interface ReadPage extends PageText {
  /** Clockwise degrees by which the page was turned to stand upright. */
  turned: 0 | 90 | 180 | 270;
  /** JPEG of the upright page for the viewer, and its size in pixels. */
  image: Buffer;
  width: number;
  height: number;
  /** JPEG at most 240 px wide. */
  thumbnail: Buffer;
}

/** Which pages of a file make one paper; `from` and `to` are page numbers, both included. */
export interface PaperSpan {
  from: number;
  to: number;
}

/** What the reader says of one paper. It decides nothing. */
export interface PaperReading extends PaperSpan {
  candidates: Candidate[];
  /** The first candidate's class, or `unrecognised` when its confidence is under the line. */
  class: Candidate['class'];
  confidence: number;
  /** ISO 3166-1 alpha-2 country of the issuer, null when the paper does not show it. */
  country: string | null;
  facts: Facts;
}

/** What the reader is told about the household; everything optional. */
export interface ReadingContext {
  /** The household's country: date order and rules when the paper does not show its own. */
  country: string;
  /** Names of the household's own businesses, to tell invoices sent from invoices received. */
  businessNames?: string[];
}
