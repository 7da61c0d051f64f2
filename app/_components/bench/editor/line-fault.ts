import { StateEffect, StateField } from '@codemirror/state';

/** Where the line could not be read: the offending stretch and what is still open, as offsets in UTF-16 units. */
export interface FaultSpans {
  readonly start: number;
  readonly end: number;
  readonly open?: { readonly start: number; readonly end: number };
}

export const setFault = StateEffect.define<FaultSpans | undefined>();

/** The place of an error; it moves with the text until the next reading replaces it. */
export const lineFault = StateField.define<FaultSpans | undefined>({
  create: () => undefined,
  update(fault, transaction) {
    for (const effect of transaction.effects) if (effect.is(setFault)) return effect.value;
    if (!fault || !transaction.docChanged) return fault;
    const moved = (offset: number) =>
      transaction.changes.mapPos(Math.min(offset, transaction.startState.doc.length), 1);
    const { open } = fault;
    return {
      start: moved(fault.start),
      end: moved(fault.end),
      open: open && { start: moved(open.start), end: moved(open.end) },
    };
  },
});
