'use client';

import { useRef, useState, type KeyboardEvent, type ReactNode } from 'react';
import { Formula } from '../math/formula';
import { TileFace, tileClass, type Firing, type TileState, type Value } from './tile';

export interface FloorPlace {
  readonly key: string;
  /** The label of the column: TeX for a place, a word for a map that belongs to no place. */
  readonly tex?: string;
  readonly word?: string;
}

export interface FloorCell {
  readonly key: string;
  /** "At 3, degree 2: both sides [2]" */
  readonly name: string;
  readonly state: TileState;
  readonly left?: Value;
  readonly right?: Value;
}

export interface FloorRow {
  readonly degree: number;
  /** One for each place, in the same order; `undefined` where there is nothing to compare. */
  readonly cells: readonly (FloorCell | undefined)[];
  /** What ends the row: the canonical form read off it. */
  readonly of?: ReactNode;
}

interface Props {
  label: string;
  places: readonly FloorPlace[];
  rows: readonly FloorRow[];
  heading?: string;
  onShow?: (cell: FloorCell | undefined) => void;
}

const firings: readonly Firing[] = ['a', 'b', 'c'];
const largeUpTo = 10;
const shownUpTo = 16;
/** Digits that stand over a tile; a longer number is shown by its ends, and in full in the table of evidence. */
const widestNumber = 6;
/** Characters of a polynomial that stand over a tile; of a longer one its first term does. */
const widestPolynomial = 7;

const isQuiet = (cell: FloorCell | undefined) => cell === undefined || cell.state === 'agree' || cell.state === 'none';

const placeLabel = ({ key, word, tex = key }: FloorPlace): ReactNode => {
  if (word !== undefined) return word;
  if (!/^\d+$/.test(tex)) {
    const head = key.length > widestPolynomial ? /^.[^+-]*[+-]/.exec(tex)?.[0] : undefined;
    return head === undefined ? (
      <Formula tex={tex} />
    ) : (
      <span title={key}>
        <span aria-hidden="true">
          <Formula tex={`${head}\\cdots`} />
        </span>
        <span className="sr">{key}</span>
      </span>
    );
  }
  if (tex.length <= widestNumber) return tex;
  return (
    <>
      <span aria-hidden="true">
        {tex.slice(0, 2)}…{tex.slice(-2)}
      </span>
      <span className="sr">{tex}</span>
    </>
  );
};

/** Degrees down, places across; the canonical form ends each row. One tab stop a row, arrows walk, Enter shows. */
export function Floor({ label, places, rows, heading, onShow }: Props) {
  const [stops, setStops] = useState<Record<number, number>>({});
  const [chosen, setChosen] = useState<string>();
  const table = useRef<HTMLDivElement>(null);

  const crowded = places.length > shownUpTo;
  const columns = places
    .map((place, index) => ({ place, index }))
    .filter(({ index }) => !crowded || rows.some((row) => !isQuiet(row.cells[index])));
  const leftOut = places.length - columns.length;
  const small = columns.length > largeUpTo;

  const walk = (row: number, column: number) => {
    const tile = table.current?.querySelector<HTMLElement>(`[data-spot="${row}:${column}"]`);
    if (!tile) return false;
    setStops((was) => ({ ...was, [row]: column }));
    tile.focus();
    return true;
  };
  const onKeyDown = (event: KeyboardEvent, row: number, column: number) => {
    const step = { ArrowRight: [0, 1], ArrowLeft: [0, -1], ArrowDown: [1, 0], ArrowUp: [-1, 0] }[event.key];
    if (!step || event.ctrlKey || event.altKey || event.metaKey) return;
    event.preventDefault();
    const [down = 0, across = 0] = step;
    for (
      let r = row + down, c = column + across;
      r >= 0 && c >= 0 && r < rows.length && c < columns.length;
      r += down, c += across
    ) {
      if (walk(r, c)) return;
    }
  };
  const show = (cell: FloorCell) => {
    const next = chosen === cell.key ? undefined : cell.key;
    setChosen(next);
    onShow?.(next === undefined ? undefined : cell);
  };

  return (
    <>
      <div
        className={`floor ${small ? 'small-tiles' : ''} ${columns.length > shownUpTo ? 'long' : ''}`}
        role="table"
        aria-label={label}
        ref={table}
      >
        <div role="row">
          <span className="deg" role="columnheader">
            <span className="sr">degree</span>
          </span>
          <span className="places" role="presentation">
            {columns.map(({ place }) => (
              <span key={place.key} role="columnheader" className={place.word === undefined ? undefined : 'word'}>
                {placeLabel(place)}
              </span>
            ))}
          </span>
          {heading !== undefined && (
            <span className="of" role="columnheader">
              {heading}
            </span>
          )}
        </div>
        {rows.map((row, rowIndex) => {
          const first = columns.findIndex(({ index }) => row.cells[index] !== undefined);
          const stop = stops[rowIndex] ?? first;
          return (
            <div className="lay" role="row" key={row.degree}>
              <span className="deg" role="rowheader">
                degree {String(row.degree).replace('-', '−')}
              </span>
              <span className="bed" role="presentation">
                {columns.map(({ place, index }, column) => {
                  const cell = row.cells[index];
                  return (
                    <span role="cell" key={place.key}>
                      {cell === undefined ? (
                        <span className="tile" />
                      ) : (
                        <button
                          type="button"
                          className={tileClass(
                            cell.state,
                            firings[(2 * (rowIndex + column + 1)) % 3],
                            cell.left ?? cell.right,
                          )}
                          aria-label={cell.name}
                          aria-pressed={chosen === cell.key}
                          data-spot={`${rowIndex}:${column}`}
                          tabIndex={stop === column ? 0 : -1}
                          onFocus={() =>
                            setStops((was) => (was[rowIndex] === column ? was : { ...was, [rowIndex]: column }))
                          }
                          onKeyDown={(event) => onKeyDown(event, rowIndex, column)}
                          onClick={() => show(cell)}
                        >
                          <TileFace state={cell.state} left={cell.left} right={cell.right} small={small} />
                        </button>
                      )}
                    </span>
                  );
                })}
              </span>
              {row.of !== undefined && (
                <span className="of" role="cell" data-label="canonical">
                  {row.of}
                </span>
              )}
            </div>
          );
        })}
      </div>
      {leftOut > 0 && (
        <p className="hint">
          {leftOut} more {leftOut === 1 ? 'place' : 'places'}, zero on both sides
        </p>
      )}
    </>
  );
}
