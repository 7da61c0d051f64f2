/** A single letter (or `/`) that does something on this page. */
export interface Key {
  readonly keyName: string;
  /** In the list: "copy as TeX". */
  readonly label: string;
  readonly act: () => void;
}

/** A row of the list for keys that are handled where they are pressed. */
export interface KeyNote {
  readonly keys: readonly string[];
  readonly label: string;
}

export interface KeyRow {
  readonly keys: readonly string[];
  readonly label: string;
}

/** What is registered now. Later registrations win over earlier ones with the same letter. */
export class KeyRegistry {
  private keys: Key[] = [];
  private notes: KeyNote[] = [];

  add(key: Key): () => void {
    this.keys = [...this.keys, key];
    return () => {
      this.keys = this.keys.filter((other) => other !== key);
    };
  }

  addNote(note: KeyNote): () => void {
    this.notes = [...this.notes, note];
    return () => {
      this.notes = this.notes.filter((other) => other !== note);
    };
  }

  find(letter: string): Key | undefined {
    return this.keys.findLast((key) => key.keyName.toUpperCase() === letter.toUpperCase());
  }

  rows(): KeyRow[] {
    const letters = this.keys.filter((key) => this.find(key.keyName) === key);
    return [...this.notes, ...letters.map((key) => ({ keys: [key.keyName], label: key.label }))];
  }
}

/** Places where letters are text. */
export function isWritingPlace(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false;
  return (
    target.isContentEditable ||
    target.closest('input:not([type=checkbox]):not([type=radio]), textarea, select') !== null
  );
}
