import { Fragment } from 'react';
import type { Expected, Fault } from '../fault';

interface Props {
  readonly id: string;
  readonly fault: Fault;
  readonly onInsert: (offset: number, text: string) => void;
}

function Piece({
  piece,
  offset,
  onInsert,
}: {
  piece: Expected;
  offset: number | undefined;
  onInsert: Props['onInsert'];
}) {
  const { insert } = piece;
  if (insert === undefined || offset === undefined) return <>{piece.text}</>;
  return (
    <button type="button" className="plain" title={`Write ${insert} there`} onClick={() => onInsert(offset, insert)}>
      {piece.text}
    </button>
  );
}

/** The paper note under a line that cannot be read: where, what, and what could stand there. */
export function FaultNote({ id, fault, onInsert }: Props) {
  return (
    <div className="fault" role="status" id={id}>
      <p>
        {fault.place && <b>{fault.place} </b>}
        {fault.message}
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
