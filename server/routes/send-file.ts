import type { Response } from 'express';

/** A PDF to look at or print; the name is the server's own. */
export function sendPdf(response: Response, bytes: Uint8Array, name: string): void {
  response
    .status(200)
    .type('application/pdf')
    .set('Content-Disposition', `inline; filename="${name}"`)
    .send(Buffer.from(bytes));
}

/** A calendar (RFC 5545) for a program that subscribes to it or opens it once. */
export function sendCalendar(response: Response, text: string): void {
  response
    .status(200)
    .set('Content-Type', 'text/calendar; charset=utf-8')
    .set('Content-Disposition', 'inline; filename="papers.ics"')
    .send(text);
}
