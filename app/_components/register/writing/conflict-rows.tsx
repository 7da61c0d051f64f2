import type { ReactNode } from 'react';
import type { IdentityAnswer } from '@/lib/contracts/identity-answer';
import type { IdentityForm } from '@/lib/contracts/identity-draft';
import { Button } from '../../button/button';
import { Row } from '../../shell/row';
import { Slip } from '../../slip/slip';
import { differenceOf, type Piece } from '../difference';
import { MarkedText } from '../marked-text';
import { formOf } from './form-values';

interface Props {
  /** The identity as someone else has left it. */
  readonly current: IdentityAnswer;
  readonly yours: IdentityForm;
  readonly onGoOn: () => void;
  readonly onTakeTheirs: () => void;
}

type TextKey = Exclude<keyof IdentityForm, 'warning' | 'visibility' | 'change'>;

const names: readonly (readonly [key: TextKey, name: string])[] = [
  ['kind', 'kind'],
  ['field', 'over'],
  ['statement', 'statement'],
  ['place', 'place'],
  ['uniformizer', 'uniformizer'],
  ['value', 'value'],
  ['name', 'name'],
  ['tags', 'tags'],
  ['reference', 'reference'],
  ['doi', 'DOI'],
  ['arxiv', 'arXiv'],
  ['remark', 'remark'],
];

const typed: readonly TextKey[] = ['field', 'statement', 'place', 'uniformizer', 'value'];

function Version({
  head,
  rows,
}: {
  readonly head: string;
  readonly rows: readonly (readonly [TextKey, string, ReactNode])[];
}) {
  return (
    <div>
      <h3>{head}</h3>
      <dl>
        {rows.map(([key, name, said]) => (
          <div key={key}>
            <dt>{name}</dt>
            <dd className={typed.includes(key) ? 'typed-text' : undefined}>{said}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}

const said = (pieces: readonly Piece[]): ReactNode =>
  pieces.length === 0 ? <span className="quiet">nothing</span> : <MarkedText pieces={pieces} />;

/** Someone else revised the identity meanwhile: both versions side by side, what differs marked, and the two ways on. */
export function ConflictRows({ current, yours, onGoOn, onTakeTheirs }: Props) {
  const theirs = formOf(current, current.visibility);
  const [newest] = current.revisions;
  const rows = names
    .filter(([key]) => theirs[key].trim() !== '' || yours[key].trim() !== '')
    .map(([key, name]) => {
      const kind = typed.includes(key) ? 'statement' : 'prose';
      return { key, name, ...differenceOf(theirs[key].trim(), yours[key].trim(), kind) };
    });
  return (
    <Row side="changed meanwhile" id="conflict" className="conflict">
      <Slip kind="ask">
        {newest?.author ?? 'Someone'} made revision {current.current} while you were writing
        {newest?.change === undefined ? '' : `: “${newest.change}”`}. Yours is not kept yet, and nothing of it is lost.
      </Slip>
      <div className="versions">
        <Version
          head={`Theirs, revision ${current.current}`}
          rows={rows.map(({ key, name, before }) => [key, name, said(before)] as const)}
        />
        <Version head="Yours" rows={rows.map(({ key, name, after }) => [key, name, said(after)] as const)} />
      </div>
      <div className="form-acts">
        <Button onClick={onGoOn}>Go on from theirs, with your text</Button>
        <Button kind="plain" onClick={onTakeTheirs}>
          Take theirs and drop yours
        </Button>
      </div>
    </Row>
  );
}
