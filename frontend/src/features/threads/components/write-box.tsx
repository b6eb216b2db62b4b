import { commentLimit } from '@holdwater/shared-types/threads/thread.contract.js';
import { useRef, useState, type FormEvent, type KeyboardEvent, type ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Field } from '../../../components/field';
import { useErrorWords } from '../../../lib/errors';
import { useShortcut } from '../../../lib/shortcuts';
import { useWriteComment } from '../api/write-comment';

export interface WriteBoxProps {
  lotId: string;
  onWritten?: () => void;
}

/** Writes to all three parties. What is too long says so before it is sent, and nothing typed is lost when it is not. */
export function WriteBox({ lotId, onWritten }: WriteBoxProps): ReactNode {
  const { t } = useTranslation('threads');
  const [typed, setTyped] = useState('');
  const box = useRef<HTMLTextAreaElement>(null);
  const writing = useWriteComment(lotId, () => {
    setTyped('');
    onWritten?.();
  });
  const fault = useErrorWords(writing.error);
  useShortcut('w', () => box.current?.focus());
  const text = typed.trim();
  const over = text.length - commentLimit;
  const cannotYet = over > 0 ? t('write.over', { count: over }) : undefined;
  const send = (): void => {
    if (text === '') box.current?.focus();
    else if (over <= 0 && !writing.isPending) writing.mutate(text);
  };
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    send();
  };
  const sendByKey = (event: KeyboardEvent): void => {
    if (event.key !== 'Enter' || !(event.ctrlKey || event.metaKey)) return;
    event.preventDefault();
    send();
  };
  return (
    <form className="write-box" onSubmit={submit} noValidate>
      <Field
        label={t('write.label')}
        error={over > 0 ? t('write.tooLong', { count: over, limit: commentLimit }) : faultWords(fault)}
      >
        {(control) => (
          <textarea
            {...control}
            ref={box}
            rows={typed.length > 80 ? 4 : 2}
            placeholder={t('write.placeholder')}
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
            onKeyDown={sendByKey}
          />
        )}
      </Field>
      <Act kind="first" type="submit" size="lg" cannotYet={cannotYet} busy={writing.isPending}>
        {t('write.act')}
      </Act>
    </form>
  );
}

function faultWords(fault: ReturnType<typeof useErrorWords>): string | undefined {
  return fault === null ? undefined : `${fault.title}. ${fault.safe} ${fault.next}`;
}
