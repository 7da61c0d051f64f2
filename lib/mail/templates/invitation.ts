import { type Message, setLetter } from '../letter';
import { inWords, oneLine } from '../text';

export interface InvitationProps {
  readonly groupName: string;
  readonly inviterName: string;
  readonly role: string;
  readonly link: string;
  readonly expires: Date;
}

/** Asks somebody to join a group. */
export function invitation({ groupName, inviterName, role, link, expires }: InvitationProps): Message {
  const group = oneLine(groupName);
  const inviter = oneLine(inviterName);
  const article = /^[aeiou]/.test(role) ? 'an' : 'a';
  return setLetter({
    subject: `${inviter} invites you to the group ${group}`,
    paragraphs: [
      `${inviter} invites you to join the group ${group} on Quadrel, as ${article} ${oneLine(role)}.`,
      'Quadrel is a workbench for Milnor–Witt K-theory. The group keeps its identities there, with what each was checked against.',
    ],
    action: { label: 'Join the group', link },
    afterwards: `The link is for you alone and can be used once, until ${inWords(expires)}. If you do nothing, no account is made and the invitation lapses.`,
    reason: `Sent because ${inviter} gave this address for the group ${group}.`,
  });
}
