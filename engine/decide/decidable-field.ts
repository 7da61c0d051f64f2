import type { Budget } from '../arith/budget';
import type { Element } from '../expression/element';
import type { Expression } from '../expression/expression';
import type { Condition } from '../expression/statement';
import type { DerivationStep } from '../derive/rule';
import type { AskedPlace } from './asked-place';
import type { Finding } from './finding';
import type { Counterexample, NormalizedDegree, ResiduesOutcome, SteinbergRelation, Tried, Verdict } from './outcome';

/** What was compared, map by map, and why that is complete: theorem and source. */
export interface Decision {
  readonly findings: readonly Finding[];
  readonly theorem: string;
  /** What the maps compared leave open, absent when they see everything. */
  readonly open?: readonly Open[];
  /** Where maps alone do not decide: what searches for a proof and for a counterexample came to. */
  readonly search?: Search;
}

/** A degree in which the maps compared do not see everything; the findings there are true for what they are. */
export interface Open {
  readonly degree: number;
  /** Whether the verdict is open where no finding differs; otherwise only what is true modulo η or modulo h is. */
  readonly verdict: boolean;
  readonly modEta: boolean;
  readonly modH: boolean;
  /** The group that is not seen in full, as it is named in a sentence. */
  readonly missing: string;
}

/** The outcome of searches; it says for every degree what is known, and findings are then only what there is to show. */
export interface Search {
  readonly verdicts: ReadonlyMap<number, Verdict>;
  readonly modEta: boolean | undefined;
  readonly modH: boolean | undefined;
  readonly counterexample?: Counterexample;
  readonly relations?: readonly SteinbergRelation[];
  readonly tried: Tried;
}

/** What a field offers to whoever decides over it: generic code asks only this. */
export interface DecidableField {
  /** The name as it is typed. */
  readonly name: string;
  readonly tex: string;
  decide(left: Expression, right: Expression, conditions: readonly Condition[], budget: Budget): Decision;
  /** The canonical form by degree, highest first; parts that are zero are left out. */
  normalForm(expression: Expression, conditions: readonly Condition[], budget: Budget): readonly NormalizedDegree[];
  /** The derivation of the canonical form `form` of an expression; `undefined` where it would be too long to read. */
  derivation(
    expression: Expression,
    form: Expression,
    conditions: readonly Condition[],
    budget: Budget,
  ): readonly DerivationStep[] | undefined;
  /** Side conditions under which the entries make sense; none over a field whose elements are known. */
  sideConditions(
    expressions: readonly Expression[],
    conditions: readonly Condition[],
    budget: Budget,
  ): readonly Condition[];
  /** Residues; absent for a field that has no discrete valuation the engine knows. */
  readonly residues?: (
    expression: Expression,
    places: readonly AskedPlace[] | undefined,
    uniformizer: Element | undefined,
    budget: Budget,
  ) => ResiduesOutcome;
}
