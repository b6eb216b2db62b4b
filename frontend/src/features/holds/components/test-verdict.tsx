import type { ReactNode } from 'react';
import { Mark } from '../../../components/mark';
import { markTones } from '../../../components/mark-names';
import { Numeral } from '../../../components/numeral';
import type { VerdictWords } from '../use-verdict-words';
import { verdictWashes } from '../verdict';
import '../test-verdict.css';

/** What a test's log says, on its own ground: what is expected, what it means, and what to do. */
export function TestVerdict({ words, children }: { words: VerdictWords; children?: ReactNode }): ReactNode {
  const { kind, mark, headline, expects, since, basis, gauge } = words;
  return (
    <div className={`test-verdict ${verdictWashes[kind]}`} role="status">
      <Mark name={mark} size={28} />
      <div className="said">
        {expects === null ? null : (
          <p>
            <Numeral text={expects} />
          </p>
        )}
        <p className={`headline t-${markTones[mark]}`}>
          <Numeral text={headline} />
        </p>
        {children}
        {[since, basis]
          .filter((line) => line !== null)
          .map((line) => (
            <p key={line} className="s mid">
              <Numeral text={line} />
            </p>
          ))}
        {gauge === null ? null : <GaugeLine gauge={gauge} />}
      </div>
    </div>
  );
}

/** What shutting the gauge valve showed. */
export function GaugeLine({ gauge }: { gauge: NonNullable<VerdictWords['gauge']> }): ReactNode {
  return (
    <p className="gauge-line s">
      <Mark name={gauge.mark} size={20} />
      <span className={`t-${markTones[gauge.mark]}`}>
        <Numeral text={gauge.text} />
      </span>
    </p>
  );
}
