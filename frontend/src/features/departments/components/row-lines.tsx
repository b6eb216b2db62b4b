import type { ReactNode } from 'react';
import { Numeral } from '../../../components/numeral';
import { changedWords } from '../changed-words';

/** The lines of a row: one stands alone, several are a list. */
export function RowLines({ lines }: { lines: readonly string[] }): ReactNode {
  return <Each lines={lines}>{(line) => <Numeral text={line} />}</Each>;
}

/** The lines of a row that changed, the words that are new set off. */
export function ChangedLines({ lines, before }: { lines: readonly string[]; before: readonly string[] }): ReactNode {
  return (
    <Each lines={lines}>
      {(line, at) =>
        before.includes(line) ? (
          <Numeral text={line} />
        ) : (
          changedWords(before[at] ?? before.at(-1) ?? '', line).map(({ text, isNew }, run) => (
            <span key={run}>
              {run === 0 ? null : ' '}
              {isNew ? (
                <ins>
                  <Numeral text={text} />
                </ins>
              ) : (
                <Numeral text={text} />
              )}
            </span>
          ))
        )
      }
    </Each>
  );
}

function Each(props: { lines: readonly string[]; children: (line: string, at: number) => ReactNode }): ReactNode {
  const { lines, children } = props;
  if (lines.length === 1) return children(lines[0] ?? '', 0);
  return (
    <ul>
      {lines.map((line, at) => (
        <li key={at}>{children(line, at)}</li>
      ))}
    </ul>
  );
}
