import { Formula } from '../math/formula';
import type { FloorCell, FloorPlace } from './floor';
import { TileFace, tileClass } from './tile';

/** One row of places, each label above its tile; it wraps, and the labels go along. */
export function Strip({
  label,
  places,
  cells,
}: {
  label: string;
  places: readonly FloorPlace[];
  cells: readonly FloorCell[];
}) {
  return (
    <ul className={`strip ${cells.length > 10 ? 'small-tiles' : ''}`} aria-label={label}>
      {cells.map((cell, index) => (
        <li className="spot" key={cell.key}>
          <span className="lab" aria-hidden="true">
            {places[index]?.word ?? <Formula tex={places[index]?.tex ?? ''} />}
          </span>
          <span className={tileClass(cell.state, 'a', cell.left)} role="img" aria-label={cell.name}>
            <TileFace state={cell.state} left={cell.left} right={cell.right} />
          </span>
        </li>
      ))}
    </ul>
  );
}
