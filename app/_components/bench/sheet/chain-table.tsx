import type { ChainStep } from '@/lib/contracts/compare';
import { VerdictMark } from '../../marks/verdict-mark';
import { verdictWord } from '../verdict-words';
import { LongFormula } from './long-formula';

interface Props {
  readonly chain: readonly ChainStep[];
  readonly firstWrong: number | undefined;
  readonly shown: number;
  readonly onShow: (step: number) => void;
}

/** A chain of equalities, every step with its mark; a click on a step shows what was compared in it. */
export function ChainTable({ chain, firstWrong, shown, onShow }: Props) {
  const first = chain[0];
  const long = chain.some((step) => Math.max(step.left.text.length, step.right.text.length) > 52);
  return (
    <table className={`chain chain-judged ${long ? 'long' : ''}`}>
      <caption className="sr">The steps of the chain</caption>
      <tbody>
        {first && (
          <tr>
            <td className="eq">
              <LongFormula text={first.left.text} tex={first.left.tex} />
            </td>
            <td className="why" />
          </tr>
        )}
        {chain.map((step, index) => (
          <tr key={index} className={index === firstWrong ? 'wrong' : undefined}>
            <td className="eq rel">
              <LongFormula text={`= ${step.right.text}`} tex={`{} = ${step.right.tex}`} />
            </td>
            <td className="why">
              <button type="button" className="chain-step" aria-pressed={index === shown} onClick={() => onShow(index)}>
                <VerdictMark of={step.verdict} />
                <span>
                  {verdictWord[step.verdict]}
                  {index === firstWrong && chain.length > 1 ? ', the first wrong step' : ''}
                </span>
              </button>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
