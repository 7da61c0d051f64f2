import type { DerivationStep } from '../derive/rule';
import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import type { Condition, Statement } from '../expression/statement';

export type Verdict = 'equal' | 'different' | 'undecided';

/** The homomorphisms by which classes are compared. */
export type MapName =
  | 'rank'
  | 'signature'
  | 'residue' // ∂ at a place, against its default uniformizer
  | 'specialisation' // s at a place
  | 'product' // the class modulo η in degree 1: the product of the entries in F^×
  | 'symbol' // the norm residue symbol modulo η in degree 2
  | 'discriminant'
  | 'hasse'
  | 'class' // the class itself, in a field where it has a closed form
  | 'word'; // the coefficient part of a canonical word in letters

/** One homomorphism applied to both sides, in one degree. */
export interface Compared {
  readonly map: MapName;
  /** `real`, a prime such as `7`; absent when the map belongs to no place. */
  readonly place?: string;
  readonly left: Expression;
  readonly right: Expression;
  readonly same: boolean;
  /** Whether both values are zero. */
  readonly zero: boolean;
  /** The group the values lie in, in TeX. */
  readonly target: string;
}

export interface ComparedDegree {
  readonly degree: number;
  readonly verdict: Verdict;
  readonly compared: readonly Compared[];
}

/** The first invariant that takes two values, in words a mathematician uses. */
export interface Separating {
  readonly degree: number;
  readonly map: MapName;
  readonly place?: string;
  readonly left: Expression;
  readonly right: Expression;
  readonly sentence: string;
}

/** A field as answers name it. */
export interface NamedField {
  readonly name: string;
  readonly tex: string;
}

/** Values at which a statement about every field fails. */
export interface Counterexample {
  readonly field: NamedField;
  /** The letters that got a value; those left out stand for themselves. */
  readonly values: readonly { readonly letter: string; readonly value: Element }[];
  /** The statement with the values put in, as it can be asked over the field. */
  readonly statement: Statement;
}

/** A multiple of a Steinberg relation [left][right] = 0, left + right = 1. */
export interface SteinbergRelation {
  /** What [left][right] is multiplied by, from the left. */
  readonly times: Expression;
  readonly left: Element;
  readonly right: Element;
}

/** A field in which values were tried. */
export interface TriedField {
  readonly field: NamedField;
  /** How many lawful values there did not separate the sides. */
  readonly values: number;
}

/** How many steps a search may take, and whether it ended because of that. */
export interface SearchLimit {
  readonly steps: number;
  readonly reached: boolean;
}

/** What the two searches over an unspecified field looked at. */
export interface Tried {
  readonly fields: readonly TriedField[];
  /** How far values may be looked for. */
  readonly limit: SearchLimit;
  /** The search for a proof; absent where none was needed, since the sides were compared completely. */
  readonly proof?: {
    /** How far a proof may be looked for, with the units of one choice in one degree. */
    readonly limit: SearchLimit;
    /** The units of which all entries are products. */
    readonly generators: readonly Element[];
    /** How many Steinberg pairs x + y = 1 there are among their products. */
    readonly pairs: number;
    /** How many multiples of Steinberg relations were combined. */
    readonly relations: number;
    /** How many chains of residues and specialisations were followed to their ends. */
    readonly chains: number;
  };
}

export interface Evidence {
  /** By maps over the field itself, or by values at which the statement fails; then what is compared belongs to these. */
  readonly kind: 'invariants' | 'certificate' | 'counterexample';
  readonly separating?: Separating;
  /** Why the compared maps see everything: the theorem and its published source. */
  readonly theorem: string;
  /** Equal modulo η, that is in Milnor K-theory; left out where that is not known. */
  readonly modEta?: boolean;
  /** Equal modulo h, that is in the Witt ring; left out where that is not known. */
  readonly modH?: boolean;
  readonly counterexample?: Counterexample;
  /** Multiples of Steinberg relations that add up to the difference of the sides. */
  readonly relations?: readonly SteinbergRelation[];
  readonly tried?: Tried;
}

export interface CompareOutcome {
  readonly verdict: Verdict;
  readonly parts: readonly ComparedDegree[];
  readonly sideConditions: readonly Condition[];
  readonly evidence: Evidence;
}

export interface NormalizedDegree {
  readonly degree: number;
  readonly normalForm: Expression;
  /** Promise: two elements of the field are equal iff their canonical forms print alike. */
  readonly canonical: boolean;
}

/** One rewriting: the relation used, the field elements it was used at, the whole expression before and after. */
export type Step = DerivationStep;

export interface NormalizeOutcome {
  /** By degree, highest first; empty for zero. */
  readonly parts: readonly NormalizedDegree[];
  readonly sideConditions: readonly Condition[];
  readonly steps?: readonly Step[];
}

export interface Residue {
  /** A prime such as `7`. */
  readonly place: string;
  /** A field one can type. */
  readonly residueField: string;
  readonly uniformizer: Element;
  readonly value: Expression;
  /** Degree of the residue's highest non-zero part, or of the class less one when the residue is zero. */
  readonly degree: number;
  readonly zero: boolean;
  readonly specialisation: Expression;
}

export interface ResiduesOutcome {
  readonly residues: readonly Residue[];
  /** Whether the residue is zero at every place not listed. */
  readonly unramifiedElsewhere: boolean;
}
