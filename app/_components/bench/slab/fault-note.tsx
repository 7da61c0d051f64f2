import { Fragment } from 'react';
import type { Expected, Fault } from '../fault';

interface Props {
  readonly id: string;
  readonly fault: Fault;
  readonly onInsert: (offset: number, text: string) => void;
}

/** Words with what is to be typed between backticks, as code. */
function Typed({ text }: { readonly text: string }) {
  return text.split('`').map((part, index) => (index % 2 === 0 ? part : <code key={index}>{part}</code>));
}

/** A piece that could stand there; where it is known what to write, its first sign is a button that writes it. */
function Piece({
  piece,
  offset,
  onInsert,
}: {
  piece: Expected;
  offset: number | undefined;
  onInsert: Props['onInsert'];
}) {
  const { insert, text } = piece;
  const [before = '', sign, ...rest] = text.split('`');
  if (insert === undefined || offset === undefined) return <Typed text={text} />;
  return (
    <>
      {sign === undefined ? '' : before}
      <button type="button" className="plain" title={`Write ${insert} there`} onClick={() => onInsert(offset, insert)}>
        {sign ?? before}
      </button>
      <Typed text={rest.join('`')} />
    </>
  );
}

/** The paper note under a line that cannot be read: where, what, and what could stand there. */
export function FaultNote({ id, fault, onInsert }: Props) {
  return (
    <div className="fault" role="status" id={id}>
      <p>
        {fault.place && <b>{fault.place} </b>}
        <Typed text={fault.message} />
      </p>
      {fault.expected.length > 0 && (
        <p>
          Expected here:{' '}
          {fault.expected.map((piece, index) => (
            <Fragment key={piece.text}>
              {index > 0 && (index === fault.expected.length - 1 ? ' or ' : ', ')}
              <Piece piece={piece} offset={fault.offset} onInsert={onInsert} />
            </Fragment>
          ))}
          .
        </p>
      )}
    </div>
  );
}
