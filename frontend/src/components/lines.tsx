import { useEffect, useState, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';

/** Milliseconds until lines stand in for words, and until words say that it takes long. */
export const linesAfterMs = 300;
export const wordsAfterMs = 8000;

const lengths: readonly [number, number][] = [
  [46, 23],
  [33, 31],
  [54, 15],
  [38, 28],
];

export interface LinesProps {
  rows?: number;
  /** Said after eight seconds: what takes long and why. */
  slowWords?: ReactNode;
  /** Draws a dashed vessel at the head of each row. */
  hasVessel?: boolean;
}

/** Stands in for words that are being read: nothing at first, lines after 300 ms, words after 8 s. Nothing shimmers. */
export function Lines({ rows = 4, slowWords, hasVessel = false }: LinesProps): ReactNode {
  const { t } = useTranslation('marks');
  const [step, setStep] = useState<'none' | 'lines' | 'words'>('none');
  useEffect(() => {
    const lines = window.setTimeout(() => setStep('lines'), linesAfterMs);
    const words = window.setTimeout(() => setStep('words'), wordsAfterMs);
    return () => {
      window.clearTimeout(lines);
      window.clearTimeout(words);
    };
  }, []);
  return (
    <div role="status" aria-busy="true">
      {step === 'none' ? null : (
        <>
          <span className="hidden-words">{t('page.reading')}</span>
          {Array.from({ length: rows }, (_, index) => {
            const [first, second] = lengths[index % lengths.length] ?? [40, 20];
            return (
              <div className="lines-row" key={index} aria-hidden="true">
                {hasVessel ? <span className="box" /> : null}
                <span className="a" style={{ width: `${first}%` }} />
                <span className="b" style={{ width: `${second}%` }} />
              </div>
            );
          })}
        </>
      )}
      {step === 'words' ? <p className="s mid">{slowWords ?? t('page.stillReading')}</p> : null}
    </div>
  );
}
