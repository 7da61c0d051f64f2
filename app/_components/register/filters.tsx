import type { IdentityQuery } from '@/lib/contracts/identity-query';
import type { AddressKey } from './address';
import { checkWord } from './check-words';

/** What the register can be narrowed down to. */
export interface Choices {
  readonly fields: readonly { readonly text: string }[];
  readonly tags: readonly string[];
  readonly keepers: readonly string[];
  readonly degrees: readonly number[];
}

type FilterKey = Extract<AddressKey, 'field' | 'tag' | 'verdict' | 'degree' | 'keeper'>;

interface Filter {
  readonly key: FilterKey;
  readonly label: string;
  readonly all: string;
  readonly options: readonly (readonly [value: string, label: string])[];
}

function filtersOf({ fields, tags, keepers, degrees }: Choices): readonly Filter[] {
  return [
    {
      key: 'field',
      label: 'Field',
      all: 'every field',
      options: fields.map(({ text }) => [text, text === 'any' ? 'any field' : text]),
    },
    { key: 'tag', label: 'Tag', all: 'every tag', options: tags.map((tag) => [tag, tag]) },
    { key: 'verdict', label: 'Last check', all: 'every verdict', options: Object.entries(checkWord) },
    {
      key: 'degree',
      label: 'Degree',
      all: 'every degree',
      options: degrees.map((degree) => [String(degree), `degree ${String(degree).replace('-', '−')}`]),
    },
    { key: 'keeper', label: 'Kept by', all: 'everyone', options: keepers.map((keeper) => [keeper, keeper]) },
  ];
}

interface Props {
  readonly query: IdentityQuery;
  readonly choices: Choices;
  readonly onChoose: (changes: Partial<Record<FilterKey, string>>) => void;
}

interface PickProps extends Pick<Props, 'query' | 'onChoose'> {
  readonly filter: Filter;
}

function FilterPick({ filter: { key, label, all, options }, query, onChoose }: PickProps) {
  const value = String(query[key] ?? '');
  const known = value === '' || options.some(([option]) => option === value);
  return (
    <span className={`pick ${value === '' ? '' : 'set'}`}>
      <select name={key} aria-label={label} value={value} onChange={(event) => onChoose({ [key]: event.target.value })}>
        <option value="">{all}</option>
        {!known && <option value={value}>{value}</option>}
        {options.map(([option, word]) => (
          <option key={option} value={option}>
            {word}
          </option>
        ))}
      </select>
    </span>
  );
}

/** The lists by which the register is narrowed down; those that are set stand out, those that are needed less open below. */
export function Filters({ query, choices, onChoose }: Props) {
  const filters = filtersOf(choices);
  const more = filters.slice(2);
  const set = more.filter(({ key }) => query[key] !== undefined).length;
  return (
    <>
      {filters.slice(0, 2).map((filter) => (
        <FilterPick key={filter.key} filter={filter} query={query} onChoose={onChoose} />
      ))}
      <details className="opens from-left">
        <summary className={`pick ${set === 0 ? '' : 'set'}`}>{set === 0 ? 'more filters' : `${set} more set`}</summary>
        <div className="opened listed">
          {more.map((filter) => (
            <FilterPick key={filter.key} filter={filter} query={query} onChoose={onChoose} />
          ))}
        </div>
      </details>
      <noscript>
        <button type="submit" className="btn">
          Look
        </button>
      </noscript>
    </>
  );
}
