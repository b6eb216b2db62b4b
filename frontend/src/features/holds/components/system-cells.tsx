import { useId, type ReactNode } from 'react';
import { Mark, type MarkName } from '../../../components/mark';
import type { MarkTone } from '../../../components/mark-names';
import { Numeral } from '../../../components/numeral';

export interface SystemCell {
  readonly key: string;
  readonly label: string;
  /** What is up and what is needed: "not up, needs 50 psi". */
  readonly line: string;
  readonly mark: MarkName;
  readonly tone: MarkTone;
}

export interface SystemCellsProps {
  label: string;
  cells: readonly SystemCell[];
  chosen: string;
  onChoose: (key: string) => void;
}

/** One system at a time: ruled cells with what is up, the chosen one dimensioned. */
export function SystemCells({ label, cells, chosen, onChoose }: SystemCellsProps): ReactNode {
  const name = useId();
  return (
    <div role="radiogroup" aria-label={label} className="system-cells">
      {cells.map((cell) => {
        const isOn = cell.key === chosen;
        return (
          <label key={cell.key} className={isOn ? 'on dimmed' : undefined}>
            <input
              type="radio"
              className="hidden-words"
              name={name}
              value={cell.key}
              checked={isOn}
              onChange={() => onChoose(cell.key)}
            />
            <Mark name={cell.mark} size={28} />
            <span className="grow">
              <span className="word">{cell.label}</span>
              <span className={`line t-${cell.tone}`}>
                <Numeral text={cell.line} />
              </span>
            </span>
          </label>
        );
      })}
    </div>
  );
}
