interface Props {
  readonly verdict: 'equal' | 'different' | 'undecided' | undefined;
  readonly warning: boolean;
  readonly revising: boolean;
}

function outcomeWords({ verdict, warning }: Props): string {
  if (verdict === 'equal') return 'The check confirms it: it is kept as checked.';
  if (verdict === 'different')
    return 'The two sides are not the same. It is kept as a warning, which says so, with ≠ between them; the check confirms that.';
  if (warning) return 'It says that the two sides are not the same. Until a check confirms that, it is a draft.';
  return 'Until a check confirms it, it is a draft. It can be checked again at any time, and by a later engine.';
}

/** The notes beside the form: what becomes of the identity when it is kept. */
export function WhatHappens(props: Props) {
  return (
    <aside className="notes from-top" aria-label="What happens then">
      <div>
        <h2>when it is kept</h2>
        <p>{outcomeWords(props)}</p>
      </div>
      <div>
        <h2>{props.revising ? 'what stays' : 'what can be changed'}</h2>
        <p>
          {props.revising
            ? 'Earlier revisions stay as they are, and their addresses keep working.'
            : 'A later change makes a new revision; this one stays, and its address keeps working.'}
        </p>
      </div>
      <div>
        <h2>a caution</h2>
        <p>A verdict is a computation under stated hypotheses. It does not replace refereeing.</p>
      </div>
    </aside>
  );
}
