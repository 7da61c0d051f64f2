import '../_components/register/register.css';
import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { isAnswer } from '@/lib/compute/request';
import { requireMember } from '@/lib/people/current';
import { may } from '@/lib/permissions';
import { registerChoices } from '@/lib/register/choices';
import { listIdentities } from '@/lib/register/list';
import { registerHref } from '../_components/register/address';
import { EmptyRegister, NoMatch } from '../_components/register/no-identities';
import { type Given, readAddress } from '../_components/register/read-address';
import { RegisterLedger } from '../_components/register/register-ledger';
import { RegisterPages } from '../_components/register/register-pages';
import { RegisterRoom } from '../_components/register/register-room';
import { StatesRow } from '../_components/register/states-row';
import { WriteOut } from '../_components/register/write-out';
import { Colophon } from '../_components/shell/colophon';

export const metadata: Metadata = { title: 'Register' };

/** The identities of the group. What is looked for, the order and the page all stand in the address. */
export default async function RegisterPage({ searchParams }: { readonly searchParams: Promise<Given> }) {
  const { query, before } = readAddress(await searchParams);
  const member = await requireMember('register-read', registerHref(query));
  const [reply, choices] = await Promise.all([listIdentities(member, query), registerChoices(member)]);
  // A cursor of another order, or a field that cannot be read: the address was mistyped.
  if (!isAnswer(reply)) redirect(registerHref(query, reply.problem.part === 'field' ? { field: undefined } : {}));
  const list = reply.answer;
  const title = `Register of ${member.group.name}`;
  return (
    <>
      <RegisterRoom
        query={query}
        choices={choices}
        states={<StatesRow query={query} counts={list.states} />}
        writeOut={<WriteOut query={query} />}
      >
        <h1 className="sr">{title}</h1>
        <p className="sr" role="status">
          {list.total === 1 ? 'One identity found.' : `${list.total} identities found.`}
        </p>
        {list.identities.length > 0 ? (
          <>
            <RegisterLedger identities={list.identities} query={query} caption={title} />
            <RegisterPages query={query} list={list} before={before} />
          </>
        ) : choices.fields.length === 0 ? (
          <EmptyRegister mayKeep={may(member, 'identity-write')} />
        ) : (
          <NoMatch />
        )}
      </RegisterRoom>
      <Colophon />
    </>
  );
}
