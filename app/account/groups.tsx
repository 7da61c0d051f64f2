import Link from 'next/link';
import type { GroupSeat } from '@/lib/people/caller';
import { ActionForm } from '../_components/form/action-form';
import { SendButton } from '../_components/form/send-button';
import { Ledger } from '../_components/ledger/ledger';
import { switchGroup } from './actions';

interface Props {
  seats: readonly GroupSeat[];
  /** The group one is in now. */
  current: string | undefined;
}

/** The groups of a person, with the way from one to another. */
export function Groups({ seats, current }: Props) {
  if (seats.length === 0)
    return (
      <p className="lead">
        You are in no group. Open the invitation in your mail, or <Link href="/start">start a group</Link>.
      </p>
    );
  return (
    <ActionForm action={switchGroup} label="Groups">
      <Ledger
        caption="Your groups"
        head={['group', 'short name', 'your role', <span key="over">go over</span>]}
        narrow="stack"
      >
        {seats.map((seat) => (
          <tr key={seat.id}>
            <th scope="row" className="st named">
              {seat.name}
            </th>
            <td className="path">{seat.slug}</td>
            <td data-label="as">{seat.role}</td>
            <td>
              {seat.id === current ? (
                <Link href="/group">You are here</Link>
              ) : (
                <SendButton kind="plain" name="group" value={seat.slug} label={`Go over to ${seat.name}`}>
                  Go over
                </SendButton>
              )}
            </td>
          </tr>
        ))}
      </Ledger>
      <p className="form-acts">
        <Link href="/start">Start another group</Link>
      </p>
    </ActionForm>
  );
}
