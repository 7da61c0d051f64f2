import { type Message, setLetter } from '../letter';
import { inWords, oneLine } from '../text';

export interface PasswordResetProps {
  readonly name: string;
  readonly link: string;
  readonly expires: Date;
}

/** Lets somebody who lost a password choose another. */
export function passwordReset({ name, link, expires }: PasswordResetProps): Message {
  return setLetter({
    subject: 'Choose a new password for Quadrel',
    paragraphs: [
      `${oneLine(name)}, a new password was asked for on Quadrel for the account with this address.`,
      'Choosing one ends every session of the account, on all devices.',
    ],
    action: { label: 'Choose a new password', link },
    afterwards: `The link can be used once, until ${inWords(expires)}. If you did not ask, do nothing: your password stays as it is.`,
    reason: 'Sent because a new password was asked for with this address.',
  });
}
