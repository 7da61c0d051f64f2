import type { Expression } from '../expression/expression';
import { isZero, total } from '../ring/write-word';
import type { NormalizedDegree } from './outcome';

/** A class that is written word by word, degree by degree: each word comes before those that were put earlier. */
export class WrittenDegrees {
  private readonly parts = new Map<number, Expression[]>();

  put(degree: number, word: Expression): void {
    if (isZero(word)) return;
    const words = this.parts.get(degree);
    if (words === undefined) this.parts.set(degree, [word]);
    else words.push(word);
  }

  /** What was put, by degree, the highest first; `canonical` is the promise made for the forms. */
  forms(canonical: boolean): readonly NormalizedDegree[] {
    return [...this.parts]
      .sort(([a], [b]) => b - a)
      .map(([degree, words]) => ({ degree, normalForm: total(words.toReversed()), canonical }));
  }
}
