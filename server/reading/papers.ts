/** From the text of a file's pages to its papers, each with facts and ranked classes. Pure. */
import { classifyPaper } from './classify/classify-paper.ts';
import { isAddressedToBusiness, findAddressee } from './facts/addressee.ts';
import { findCountry } from './facts/country.ts';
import { findIssuer } from './facts/issuer.ts';
import { findMrz } from './facts/mrz.ts';
import { listPaperLines } from './facts/paper-lines.ts';
import type { PaperLine } from './facts/paper-lines.ts';
import { readFacts } from './facts/read-facts.ts';
import { isSeparator, splitPages } from './split/split-pages.ts';
import type { PageText, PaperReading, ReadingContext } from './types.ts';

/** Whether one of the household's own businesses stands at the head of the paper. */
function isFromOwnBusiness(lines: readonly PaperLine[], names: readonly string[]): boolean {
  const issuer = findIssuer(lines)?.value.toLowerCase() ?? '';
  const head = lines
    .slice(0, 6)
    .map((line) => line.text.toLowerCase())
    .join('\n');
  return names.some((name) => {
    const own = name.trim().toLowerCase();
    return own.length > 2 && (issuer.includes(own) || head.includes(own));
  });
}

/** What the reader says of pages that make one paper. It decides nothing. */
export function readPaper(
  pages: PageText[],
  context: ReadingContext,
): Omit<PaperReading, 'from' | 'to'> {
  const lines = listPaperLines(pages);
  const { country } = findCountry(lines, context.country);
  const names = context.businessNames ?? [];
  const isOwnBusiness = isFromOwnBusiness(lines, names);
  const classification = classifyPaper(lines, {
    mrz: findMrz(lines.map((line) => line.text)),
    isOwnBusiness,
    isToBusiness: !isOwnBusiness && isAddressedToBusiness(lines, findAddressee(lines), names),
  });
  const facts = readFacts(lines, classification.class, country, context.country);
  return { ...classification, country, facts };
}

/** The papers of a file in order. Every page but separator sheets belongs to exactly one of them. */
export function readPapers(pages: PageText[], context: ReadingContext): PaperReading[] {
  return splitPages(pages).map((span) => {
    const own = pages.filter(
      (page) => page.number >= span.from && page.number <= span.to && !isSeparator(page),
    );
    return { ...span, ...readPaper(own, context) };
  });
}
