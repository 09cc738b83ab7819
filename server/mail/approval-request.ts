import { approvalDays } from '../contract/shred-lists.ts';
import type { ComposedMail } from './letter.ts';
import { generalGuidance, greet, tidyLine, writeLetter } from './letter.ts';
import { sayCount } from './say-day.ts';

export interface ApprovalRequest {
  personName: string;
  householdName: string;
  practiceName: string;
  listNumber: number;
  papers: number;
  sheets: number;
  /** Opens the list after signing in. */
  url: string;
}

/** Asks a person with the right for an answer to a shred list. What is on the list is only seen after signing in. */
export function composeApprovalRequest(request: ApprovalRequest): ComposedMail {
  const practiceName = tidyLine(request.practiceName);
  const householdName = tidyLine(request.householdName);
  const size = `${sayCount(request.papers, 'paper')}, ${sayCount(request.sheets, 'sheet')}`;
  return writeLetter({
    subject: 'Slackwater: a list is waiting for your answer',
    greeting: greet(request.personName),
    parts: [
      {
        kind: 'paragraph',
        words: `${practiceName} has prepared shred list ${request.listNumber} for the household "${householdName}" (${size}) and asks whether these papers may be destroyed.`,
      },
      { kind: 'link', words: 'Look at the list', url: request.url },
      {
        kind: 'paragraph',
        words: `Look at each paper, and keep back whatever you want to keep. Nothing is destroyed unless you approve, and an approval lapses after ${approvalDays} days.`,
      },
    ],
    smallPrint: [
      generalGuidance,
      `You get this because you may approve for the household "${householdName}" at ${practiceName}.`,
    ],
  });
}
