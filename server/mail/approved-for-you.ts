import type { IsoDate } from '../contract/dates.ts';
import type { ComposedMail } from './letter.ts';
import { generalGuidance, greet, tidyLine, writeLetter } from './letter.ts';
import { sayCount, sayDay } from './say-day.ts';

export interface ApprovedForYou {
  personName: string;
  householdName: string;
  practiceName: string;
  /** Who of the practice recorded the approval. */
  approvedByName: string;
  listNumber: number;
  version: number;
  papers: number;
  sheets: number;
  /** The instruction as it was recorded. */
  instruction: { how: string; on: IsoDate; words: string };
  notBefore: IsoDate;
  lapsesOn: IsoDate;
  url: string;
}

const howWords: Record<string, string> = {
  'in-person': 'in person',
  phone: 'by phone',
  letter: 'by letter',
  'e-mail': 'by e-mail',
};

/** Tells a client that the practice approved a shred list on their recorded instruction, and how to object. */
export function composeApprovedForYou(approved: ApprovedForYou): ComposedMail {
  const practiceName = tidyLine(approved.practiceName);
  const householdName = tidyLine(approved.householdName);
  const size = `${sayCount(approved.papers, 'paper')}, ${sayCount(approved.sheets, 'sheet')}`;
  const { how, on, words } = approved.instruction;
  return writeLetter({
    subject: 'Slackwater: an approval was recorded for you',
    greeting: greet(approved.personName),
    parts: [
      {
        kind: 'paragraph',
        words: `${tidyLine(approved.approvedByName)} of ${practiceName} approved shred list ${approved.listNumber}, version ${approved.version}, of the household "${householdName}" (${size}) on an instruction given ${howWords[how] ?? tidyLine(how)} on ${sayDay(on)}. These are the words on record:`,
      },
      { kind: 'quote', words: tidyLine(words) },
      {
        kind: 'paragraph',
        words: `Unless you are there yourself, nothing is destroyed before ${sayDay(approved.notBefore)}. The approval lapses after ${sayDay(approved.lapsesOn)}.`,
      },
      { kind: 'link', words: 'Look at the list', url: approved.url },
      {
        kind: 'paragraph',
        words: `If this is not what you said, tell ${practiceName} before ${sayDay(approved.notBefore)}, or keep papers back on the page above.`,
      },
    ],
    smallPrint: [
      generalGuidance,
      `You get this because an approval was recorded on behalf of the household "${householdName}", to which you belong.`,
    ],
  });
}
