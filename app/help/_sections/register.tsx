import { type MarkedState, StateMark, stateWord } from '../../_components/marks/state-mark';
import { Formula } from '../../_components/math/formula';
import { Row } from '../../_components/shell/row';

const states: readonly { of: MarkedState; says: string }[] = [
  {
    of: 'draft',
    says: 'The last check of the current revision does not confirm what it says: this engine does not decide it yet, or the check was stopped at its limit, or nothing was found either way.',
  },
  {
    of: 'checked',
    says: 'The last check of the current revision confirms what it says: Equal for an identity, Different for a warning.',
  },
  {
    of: 'withdrawn',
    says: 'Nobody should rely on it. It keeps its number, its page and its reason, so that whoever cited it finds out.',
  },
];

/** What a group keeps, and what it may conclude from a state. */
export function Register() {
  return (
    <Row side="register" id="register" className="sec ruled">
      <div className="prose">
        <p>
          A group keeps in its register what it has found and wants to find again: a statement with its field and
          hypotheses under a name, with where it comes from, tags and a remark. To <b>keep</b> one, press <kbd>K</kbd>{' '}
          on the bench, or open a new one in the register. It is checked at once and gets the next number of the group;
          its key, such as <code>skerry-6</code>, never changes.
        </p>
        <ul className="meanings">
          {states.map(({ of, says }) => (
            <li key={of} id={`state-${of}`}>
              <StateMark of={of} />
              <p className="text">
                <b>{stateWord[of]}.</b> {says}
              </p>
            </li>
          ))}
        </ul>
        <dl className="terms">
          <div>
            <dt>What checked means</dt>
            <dd>
              The engine of the version that is named compared the two sides over the field, under the hypotheses that
              stand there, and found what the identity says. The values it compared are kept with the check.
            </dd>
          </div>
          <div>
            <dt>What it does not mean</dt>
            <dd>
              Nobody has read it. It says nothing of another field, nor of a lemma from which it was taken, nor that the
              name fits. An engine may have errors, and a check does not replace refereeing.
            </dd>
          </div>
          <div>
            <dt>Warning</dt>
            <dd>
              What looks equal and is not can be kept too, as a warning; it is shown with <Formula tex="\ne" /> between
              its sides. Checked then means that the check found them different. Without that mark a statement that was
              found different is not kept.
            </dd>
          </div>
          <div>
            <dt>Residue</dt>
            <dd>
              Kept with its class, its place, the uniformizer it was taken against and the value; the check computes the
              residue and compares it with the value over the residue field.
            </dd>
          </div>
          <div>
            <dt>Revisions</dt>
            <dd>
              A revision never changes. To revise makes the next one, which is checked anew; its page shows what
              changed, and an address such as <code>/identities/skerry-6/2</code> stays with revision 2. When two people
              revise the same revision, the second is shown both texts, and nothing typed is lost.
            </dd>
          </div>
          <div>
            <dt>Checked again</dt>
            <dd>
              The current revision can be checked again, by a later version of the engine for instance. The history of
              checks stays; the state follows the last one.
            </dd>
          </div>
          <div>
            <dt>To cite</dt>
            <dd>
              Its page gives BibTeX and a <code>\bibitem</code>, both with the number of the revision. Cite that: the
              current revision may be another one tomorrow.
            </dd>
          </div>
          <div>
            <dt>Who sees it</dt>
            <dd>
              The members of the group. One that is <b>public</b> is seen by anyone who has the address of its page,
              without an account; it stands in no list outside of the group.
            </dd>
          </div>
          <div>
            <dt>To look for</dt>
            <dd>
              Words, or how they begin, in a name, statement, hypothesis, reference or remark, and the state and the
              keeper too. What is listed can be written out as TeX, BibTeX, CSV or JSON.
            </dd>
          </div>
        </dl>
      </div>
    </Row>
  );
}
