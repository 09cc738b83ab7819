import type { Response } from 'express';

/** A PDF to look at or print; the name is the server's own. */
export function sendPdf(response: Response, bytes: Uint8Array, name: string): void {
  response
    .status(200)
    .type('application/pdf')
    .set('Content-Disposition', `inline; filename="${name}"`)
    .send(Buffer.from(bytes));
}
