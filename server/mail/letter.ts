/** The one shape of all messages: few words, no picture, nothing loaded from elsewhere. */

/** What a message says; who it goes to is the caller's business. */
export interface ComposedMail {
  subject: string;
  text: string;
  html: string;
}

export interface LetterLine {
  /** First, in strong type. */
  lead: string;
  /** After it, or below it where there is little room. */
  detail: string;
}

export type LetterPart =
  | { kind: 'paragraph'; words: string }
  | { kind: 'heading'; words: string }
  | { kind: 'lines'; lines: LetterLine[] }
  | { kind: 'quote'; words: string }
  | { kind: 'link'; words: string; url: string };

export interface Letter {
  subject: string;
  greeting: string;
  parts: LetterPart[];
  /** Small print below the rule: what this is not, and why one gets it. */
  smallPrint: string[];
}

export const generalGuidance =
  'This is general guidance. Local law decides: ask the accountant or solicitor before destroying tax, legal or property papers.';

/** One line of plain text: control characters, line breaks and invisible direction marks are taken out. */
export function tidyLine(text: string): string {
  return text
    .replace(/\p{Cf}/gu, '')
    .replace(/[\p{Cc}\s]+/gu, ' ')
    .trim();
}

/** "A" as it may stand in HTML text and in quoted attributes. */
export function escapeHtml(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}

/** "Dear Ada Example," or, without a name, "Good day,". */
export function greet(name: string): string {
  const tidy = tidyLine(name);
  return tidy ? `Dear ${tidy},` : 'Good day,';
}

/** Writes a letter as plain text and as HTML with the same words. */
export function writeLetter(letter: Letter): ComposedMail {
  return { subject: tidyLine(letter.subject), text: writeText(letter), html: writeHtml(letter) };
}

function writeText(letter: Letter): string {
  const blocks = [letter.greeting, ...letter.parts.map(writeTextPart)];
  const smallPrint = letter.smallPrint.map((words) => wrapWords(words));
  return `${[...blocks, '--', ...smallPrint].join('\n\n')}\n`;
}

function writeTextPart(part: LetterPart): string {
  switch (part.kind) {
    case 'paragraph':
      return wrapWords(part.words);
    case 'heading':
      return part.words;
    case 'lines':
      return part.lines
        .map(({ lead, detail }) => wrapWords(`${lead}: ${detail}`, '- ', '  '))
        .join('\n');
    case 'quote':
      return wrapWords(part.words, '> ');
    case 'link':
      return `${part.words}:\n${part.url}`;
  }
}

/** Breaks at 76 columns, as mail readers for plain text expect; a longer word stays whole. */
function wrapWords(words: string, prefix = '', laterPrefix = prefix): string {
  const lines: string[] = [];
  let line = '';
  for (const word of words.split(/\s+/)) {
    if (line && prefix.length + line.length + 1 + word.length > 76) {
      lines.push(line);
      line = word;
    } else {
      line = line ? `${line} ${word}` : word;
    }
  }
  lines.push(line);
  return lines.map((one, index) => `${index === 0 ? prefix : laterPrefix}${one}`).join('\n');
}

// The quiet colours of the application, written out because mail readers know no style sheet.
const ink = '#22333b';
const quiet = '#56676f';
const rule = '#d5dcdd';
const teal = '#0f6b6b';

function writeHtml(letter: Letter): string {
  const body = [
    `<p style="margin:0 0 16px">${escapeHtml(letter.greeting)}</p>`,
    ...letter.parts.map(writeHtmlPart),
    `<hr style="border:0;border-top:1px solid ${rule};margin:28px 0 14px">`,
    ...letter.smallPrint.map(
      (words) => `<p style="margin:0 0 8px;font-size:13px;color:${quiet}">${escapeHtml(words)}</p>`,
    ),
  ].join('\n');
  return [
    '<!doctype html>',
    '<html lang="en">',
    '<head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">',
    `<title>${escapeHtml(tidyLine(letter.subject))}</title></head>`,
    `<body style="margin:0;padding:24px 16px;background:#f6f8f7;color:${ink};font:16px/1.5 'Noto Sans',sans-serif">`,
    '<div style="max-width:560px;margin:0 auto;background:#ffffff;padding:28px 28px 20px">',
    body,
    '</div>',
    '</body>',
    '</html>',
    '',
  ].join('\n');
}

function writeHtmlPart(part: LetterPart): string {
  switch (part.kind) {
    case 'paragraph':
      return `<p style="margin:0 0 16px">${escapeHtml(part.words)}</p>`;
    case 'heading':
      return `<h2 style="margin:24px 0 8px;font-size:16px;font-weight:600">${escapeHtml(part.words)}</h2>`;
    case 'lines':
      return writeHtmlLines(part.lines);
    case 'quote':
      return `<blockquote style="margin:0 0 16px;padding:2px 0 2px 14px;border-left:3px solid ${rule}">${escapeHtml(part.words)}</blockquote>`;
    case 'link':
      return [
        `<p style="margin:20px 0"><a href="${escapeHtml(part.url)}" style="display:inline-block;padding:10px 18px;`,
        `background:${teal};color:#ffffff;text-decoration:none;border-radius:4px">${escapeHtml(part.words)}</a></p>`,
      ].join('');
  }
}

function writeHtmlLines(lines: readonly LetterLine[]): string {
  const items = lines.map(
    ({ lead, detail }) =>
      `<li style="margin:0 0 8px"><strong style="font-weight:600">${escapeHtml(lead)}</strong><br>${escapeHtml(detail)}</li>`,
  );
  return `<ul style="margin:0 0 16px;padding-left:20px">${items.join('')}</ul>`;
}
