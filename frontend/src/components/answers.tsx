import { useId, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Mark } from './mark';
import { tagPath, tornTagPath } from './marks-outcome';

export type Answer = 'pass' | 'fail' | 'not-seen';

const answers: readonly { value: Answer; tone: string; outline: string; dash?: string }[] = [
  { value: 'pass', tone: 't-green', outline: tagPath },
  { value: 'fail', tone: 't-red', outline: tornTagPath },
  { value: 'not-seen', tone: 't-ink2', outline: tagPath, dash: '2.2 2' },
];

export interface AnswersProps {
  /** Read aloud: which system is answered. */
  label: string;
  value: Answer | null;
  onChange: (value: Answer) => void;
}

/** Pass, fail, not seen: the chosen one shows its tag in full and is dimensioned, the others only their outlines. */
export function Answers({ label, value, onChange }: AnswersProps): ReactNode {
  const { t } = useTranslation('marks');
  const name = useId();
  return (
    <div role="radiogroup" aria-label={label} className="answers">
      {answers.map((answer) => {
        const isOn = answer.value === value;
        return (
          <label key={answer.value} className={isOn ? `on dimmed ${answer.tone}` : undefined}>
            <input
              type="radio"
              className="hidden-words"
              name={name}
              value={answer.value}
              checked={isOn}
              onChange={() => onChange(answer.value)}
            />
            {isOn ? <Mark name={answer.value} size={24} /> : <Outline path={answer.outline} dash={answer.dash} />}
            <span>{t(`${answer.value}`)}</span>
          </label>
        );
      })}
    </div>
  );
}

function Outline({ path, dash }: { path: string; dash?: string }): ReactNode {
  return (
    <svg className="mk mk24" viewBox="0 0 20 20" aria-hidden="true">
      <path d={path} fill="none" stroke="var(--ink3)" strokeWidth="1.4" strokeDasharray={dash} />
    </svg>
  );
}
