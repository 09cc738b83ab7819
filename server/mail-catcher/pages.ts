/** The pages on which caught mails are read. What stands in a mail is foreign text: all is escaped. */
import type { CaughtMail } from './catcher.ts';

const style = `
  body { margin: 0; font: 16px/1.5 'Noto Sans', system-ui, sans-serif; color: #1d2b36; background: #f5f8f8; }
  main { max-width: 60rem; margin: 0 auto; padding: 1.5rem 1rem 3rem; }
  h1 { font-size: 1.35rem; margin: 0 0 .25rem; }
  h2 { font-size: 1rem; margin: 1.5rem 0 .5rem; }
  p.lead { margin: 0 0 1.25rem; color: #3f5261; }
  ol { list-style: none; margin: 0; padding: 0; border-top: 1px solid #cfdadb; }
  li { border-bottom: 1px solid #cfdadb; }
  li a { display: block; padding: .75rem .25rem; color: inherit; text-decoration: none; }
  li a:hover, li a:focus-visible { background: #dcefed; }
  li strong, li span { display: block; }
  span, dt { color: #3f5261; font-size: .9rem; }
  a { color: #0f6b6b; }
  dl { display: grid; grid-template-columns: max-content 1fr; gap: .25rem 1rem; margin: 1rem 0; }
  dd { margin: 0; overflow-wrap: anywhere; }
  pre { white-space: pre-wrap; overflow-wrap: anywhere; background: #fff; border: 1px solid #cfdadb; padding: 1rem; }
  iframe { width: 100%; height: 32rem; border: 1px solid #cfdadb; background: #fff; }
`;

/** Makes text safe inside HTML, in elements and in quoted attributes. */
export function escapeHtml(text: string): string {
  const names: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  };
  return text.replace(/[&<>"']/g, (letter) => names[letter] ?? letter);
}

/** The list of mails, newest first. */
export function renderInbox(mails: readonly CaughtMail[]): string {
  const rows = mails.toReversed().map(
    (mail) => `<li><a href="/mails/${mail.id}">
      <strong>${escapeHtml(mail.subject || '(no subject)')}</strong>
      <span>to ${escapeHtml(mail.to.join(', '))} · ${escapeHtml(mail.receivedAt)}</span></a></li>`,
  );
  return renderPage(
    'Caught mail',
    `<h1>Caught mail</h1>
    <p class="lead">Mails that Slackwater sent on this machine. None of them has left it.</p>
    ${rows.length > 0 ? `<ol>${rows.join('')}</ol>` : '<p>No mail yet. Load this page again later.</p>'}`,
  );
}

/** One mail as text, as HTML in a frame that can run nothing, and its attachments. */
export function renderMail(mail: CaughtMail): string {
  const attachments = mail.attachments.map(
    (item) =>
      `<p>${escapeHtml(item.name || 'without a name')} (${escapeHtml(item.contentType)}, ${item.sizeBytes} bytes)</p>`,
  );
  return renderPage(
    mail.subject || '(no subject)',
    `<p><a href="/">All mails</a></p>
    <h1>${escapeHtml(mail.subject || '(no subject)')}</h1>
    <dl><dt>From</dt><dd>${escapeHtml(mail.from)}</dd>
    <dt>To</dt><dd>${escapeHtml(mail.to.join(', '))}</dd>
    <dt>Received</dt><dd>${escapeHtml(mail.receivedAt)}</dd></dl>
    <h2>Text</h2><pre>${linkAddresses(escapeHtml(mail.text))}</pre>
    ${mail.html === null ? '' : renderFrame(mail.html)}
    ${attachments.length > 0 ? `<h2>Attachments</h2>${attachments.join('')}` : ''}`,
  );
}

/** The sandbox allows links to open in a window of their own, and nothing else. */
function renderFrame(html: string): string {
  const source = `<base target="_blank">${html}`;
  return `<h2>HTML</h2><iframe title="The mail as HTML" referrerpolicy="no-referrer"
    sandbox="allow-popups allow-popups-to-escape-sandbox" srcdoc="${escapeHtml(source)}"></iframe>`;
}

/** Web addresses in text that is already escaped become links. */
function linkAddresses(escaped: string): string {
  return escaped.replace(
    /https?:\/\/[^\s<>]+?(?=(&gt;|&quot;|&#39;)|[.,;:)\]]*(\s|$))/g,
    (address) => `<a href="${address}" target="_blank" rel="noreferrer">${address}</a>`,
  );
}

function renderPage(title: string, body: string): string {
  return `<!doctype html><html lang="en-GB"><head><meta charset="utf-8">
  <meta name="viewport" content="width=device-width, initial-scale=1">
  <title>${escapeHtml(title)}</title><style>${style}</style></head><body><main>${body}</main></body></html>`;
}
