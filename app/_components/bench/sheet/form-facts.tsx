import type { ComparedPart } from '@/lib/contracts/compare';
import { Formula } from '../../math/formula';
import { Row } from '../../shell/row';
import { mapWord, placeTex } from '../map-words';

/** The invariants of a quadratic form that the answer has, in the order in which one asks for them. */
const ofForms = ['rank', 'discriminant', 'signature', 'hasse'] as const;

/** Degree 0 is a class of quadratic forms: what the answer says of it as one. */
export function FormFacts({ part }: { readonly part: ComparedPart }) {
  const facts = ofForms.flatMap((map) => part.compared.filter((one) => one.map === map));
  if (facts.length === 0) return null;
  return (
    <Row side="as a form" sideClass="to-lead" id="form">
      <dl className="facts">
        {facts.map((fact) => (
          <div key={`${fact.map}:${fact.place ?? ''}`}>
            <dt>
              {mapWord[fact.map]}
              {fact.place !== undefined && fact.map !== 'signature' && (
                <>
                  {' at '}
                  <Formula tex={placeTex(fact.place)} />
                </>
              )}
            </dt>
            <dd>
              <Formula tex={fact.left.tex} />
            </dd>
          </div>
        ))}
      </dl>
    </Row>
  );
}
