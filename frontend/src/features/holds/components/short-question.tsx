import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Numeral } from '../../../components/numeral';
import { Question } from '../../../components/question';
import type { VerdictWords } from '../use-verdict-words';

export interface ShortQuestionProps {
  isOpen: boolean;
  words: VerdictWords;
  onKeep: () => void;
  onUp: () => void;
}

/** One question before a test is said to be up that will be short at the window. */
export function ShortQuestion({ isOpen, words, onKeep, onUp }: ShortQuestionProps): ReactNode {
  const { t } = useTranslation('holds');
  return (
    <Question
      isOpen={isOpen}
      title={t('short.title')}
      keepWord={t('short.keep')}
      endWord={t('short.word')}
      endKind="first"
      onKeep={onKeep}
      onEnd={onUp}
    >
      <Numeral text={t('short.told', { expects: words.expects ?? '', headline: words.headline }).trim()} />
    </Question>
  );
}
