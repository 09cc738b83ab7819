/** Which pages of a file make one paper. */
import type { PageText, PaperSpan } from '../types.ts';

const separatorCode = 'SLACKWATER:SEPARATOR';
const pageOf = /\bpage\s*(\d{1,2})\s*(?:of|\/|von)\s*(\d{1,2})\b/i;

/** Whether a page is a separator sheet; it belongs to no paper. */
export function isSeparator(page: PageText): boolean {
  return page.code?.startsWith(separatorCode) ?? false;
}

/** Spans of pages, one for each paper, in order; separator sheets are in none. */
export function splitPages(pages: readonly PageText[]): PaperSpan[] {
  const spans: PaperSpan[] = [];
  let open = false;
  let previous: PageText | null = null;
  for (const page of pages) {
    if (isSeparator(page)) {
      open = false;
      previous = null;
      continue;
    }
    const last = spans.at(-1);
    if (open && last && previous && (page.blank || !beginsPaper(page, previous, pages.length))) {
      last.to = page.number;
    } else {
      spans.push({ from: page.number, to: page.number });
      open = true;
    }
    previous = page;
  }
  return spans;
}

function beginsPaper(page: PageText, previous: PageText, count: number): boolean {
  const match = pageOf.exec(page.text);
  if (match) return match[1] === '1';
  if (count <= 4 && !previous.blank) return false;
  return true;
}
