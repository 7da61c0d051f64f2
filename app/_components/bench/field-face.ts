import { fieldNameTex } from '@/engine/expression/to-tex';
import { readFieldName } from '@/grammar/read';

/** The name of a field as it is set, or as it is typed where it cannot be read. */
export function fieldFace(name: string): { readonly tex?: string; readonly word: string } {
  try {
    const read = readFieldName(name);
    return read.kind === 'any' ? { word: 'any field' } : { tex: fieldNameTex(read), word: name };
  } catch {
    return { word: name };
  }
}
