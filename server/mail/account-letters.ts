/** Letters about accounts. None asks for a password, and none says more than the address needs to know. */
import { type ComposedMail, greet, tidyLine, writeLetter } from './letter.ts';

const notYou =
  'If you did not ask for this, do nothing: nothing changes, and the link stops working by itself.';

/** A link to choose a new password. */
export function composePasswordReset(input: { name: string; url: string }): ComposedMail {
  return writeLetter({
    subject: 'Slackwater: choose a new password',
    greeting: greet(input.name),
    parts: [
      { kind: 'paragraph', words: 'Somebody asked for a new password for this address.' },
      { kind: 'link', words: 'Choose a new password', url: input.url },
      { kind: 'paragraph', words: 'The link works once, for two hours.' },
    ],
    smallPrint: [notYou],
  });
}

/** Tells that the password was changed. */
export function composePasswordChanged(input: { name: string }): ComposedMail {
  return writeLetter({
    subject: 'Slackwater: your password was changed',
    greeting: greet(input.name),
    parts: [
      {
        kind: 'paragraph',
        words:
          'The password of your account was changed, and other devices were signed out. If this was not you, ask for a new password on the sign-in page at once and tell your organiser.',
      },
    ],
    smallPrint: ['You get this because the account belongs to this address.'],
  });
}

/** Asks one of two addresses to confirm a change of address. */
export function composeEmailChange(input: {
  name: string;
  url: string;
  isNewAddress: boolean;
}): ComposedMail {
  return writeLetter({
    subject: 'Slackwater: confirm a change of address',
    greeting: greet(input.name),
    parts: [
      {
        kind: 'paragraph',
        words: input.isNewAddress
          ? 'This address is to become the one of your account. The old address gets a message like this one; the change is made when both have confirmed.'
          : 'The address of your account is to change. The new address gets a message like this one; the change is made when both have confirmed.',
      },
      { kind: 'link', words: 'Confirm the change', url: input.url },
      { kind: 'paragraph', words: 'The link works once, for a day.' },
    ],
    smallPrint: [notYou],
  });
}

/** Invites somebody to a household. */
export function composeInvitation(input: {
  name: string;
  inviterName: string;
  practiceName: string;
  url: string;
}): ComposedMail {
  return writeLetter({
    subject: 'Slackwater: an invitation',
    greeting: greet(input.name),
    parts: [
      {
        kind: 'paragraph',
        words: `${tidyLine(input.inviterName)} of ${tidyLine(input.practiceName)} invites you to look after a household's papers together.`,
      },
      { kind: 'link', words: 'See the invitation', url: input.url },
      { kind: 'paragraph', words: 'The link works once, for fourteen days.' },
    ],
    smallPrint: ['If you do not know the sender, do nothing: no account is made without you.'],
  });
}
