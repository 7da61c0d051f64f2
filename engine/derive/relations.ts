/** The relations and identities a derivation uses; sources: F. Morel, LNM 2052, Lemmas 3.5–3.14 (numbers from memory). */
export const RELATIONS = {
  definitions: 'definitions of ⟨a⟩, ⟪a⟫, h, ε and n_ε, multiplied out',
  etaCommutation: 'η-commutation: η[a] = [a]η',
  one: '[1] = 0',
  additivity: 'twisted additivity: [ab] = [a] + [b] + η[a][b]',
  power: 'powers: [aⁿ] = n_ε[a]',
  commutativity: 'commutativity up to ε: [a][b] = ε[b][a], so η[a][b] = η[b][a] and [a][−1] = [−1][a]',
  repetition: 'repetition: [a][a] = [−1][a]',
  etaH: 'ηh = 0 and h[−1] = 0: η²[−1] = −2η, η[−1][−1] = −2[−1]',
  secondDegree: 'K₂ of a finite field is 0: [a][b] = 0',
  squares: 'squares: η[ab²] = η[a], and η[b²] = 0',
} as const;

export type RelationKey = keyof typeof RELATIONS;
