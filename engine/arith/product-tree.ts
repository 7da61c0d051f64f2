/**
 * Products of neighbours, of their products, and so on: level 0 is the list itself, the last level its product alone.
 * A level of odd length hands its last entry up. D. Bernstein, Fast multiplication and its applications (2008), section 12.
 */
export function productTree(numbers: readonly bigint[]): readonly (readonly bigint[])[] {
  const levels: (readonly bigint[])[] = [numbers];
  for (let level = numbers; level.length > 1;) {
    const next: bigint[] = [];
    for (let i = 0; i < level.length; i += 2) next.push(i + 1 < level.length ? level[i]! * level[i + 1]! : level[i]!);
    levels.push(next);
    level = next;
  }
  return levels;
}

/** The product of a list, long factors last; 1 for the empty list. */
export function productOf(numbers: readonly bigint[]): bigint {
  return productTree(numbers).at(-1)![0] ?? 1n;
}

/** The residues of `value` modulo every number of the list the tree was made from: the same work as the tree itself. */
export function remainders(value: bigint, tree: readonly (readonly bigint[])[]): bigint[] {
  let above = [value];
  for (let k = tree.length - 1; k >= 0; k--)
    above = tree[k]!.map((n, i) => above[k === tree.length - 1 ? 0 : i >> 1]! % n);
  return above;
}
