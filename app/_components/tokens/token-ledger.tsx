import type { ListedToken, TokenState } from '@/lib/tokens/list';
import './tokens.css';
import { Ledger } from '../ledger/ledger';
import { Moment } from '../moment/moment';
import { RevokeToken } from './revoke-token';

const stateWords: Readonly<Record<TokenState, string>> = {
  live: 'Works',
  expired: 'Expired',
  revoked: 'Revoked',
  unseated: 'Its owner has left',
};

interface Props {
  tokens: readonly ListedToken[];
  /** Short name of the group they belong to. */
  group: string;
  caption: string;
  /** Whether they belong to several people. */
  ofGroup?: boolean;
}

/** Tokens as rows: name and ending, what each may do, when it was made, used and expires, and the way to end it. */
export function TokenLedger({ tokens, group, caption, ofGroup = false }: Props) {
  const head = ['token', ...(ofGroup ? ['acts for'] : []), 'may', 'made', 'expires', 'last use', 'state'];
  return (
    <Ledger
      caption={caption}
      head={[
        ...head,
        <span key="act" className="sr">
          to do
        </span>,
      ]}
      narrow="stack"
      className="tokens"
    >
      {tokens.map((token) => (
        <tr key={token.id}>
          <th scope="row">
            <span className="st">{token.name}</span>
            <span className="nm">
              ends in <code>{token.ending}</code>
            </span>
          </th>
          {ofGroup && <td data-label="acts for">{token.owner}</td>}
          <td data-label="may">{token.scopes.join(', ')}</td>
          <td className="num" data-label="made">
            <Moment at={token.madeAt} />
          </td>
          <td className="num" data-label="expires">
            <Moment at={token.expiresAt} />
          </td>
          <td className="num" data-label="last use">
            {token.lastUsedAt === null ? <span className="quiet">never</span> : <Moment at={token.lastUsedAt} time />}
          </td>
          <td data-label="state" className={token.state === 'live' ? '' : 'quiet'}>
            {stateWords[token.state]}
          </td>
          <td>
            {token.state === 'live' && (
              <RevokeToken group={group} id={token.id} name={token.name} owner={token.own ? undefined : token.owner} />
            )}
          </td>
        </tr>
      ))}
    </Ledger>
  );
}
