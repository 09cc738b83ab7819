/** Calendar days travel as `yyyy-mm-dd` text from the database to the screen; no `Date` stands between. */
import { z } from 'zod';

export const isoDateSchema = z.iso.date().describe('A calendar day, yyyy-mm-dd');
export type IsoDate = z.infer<typeof isoDateSchema>;

export const instantSchema = z.iso.datetime({ offset: true }).describe('An instant, RFC 3339');
