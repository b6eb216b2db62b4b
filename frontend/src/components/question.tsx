import { useEffect, useId, type ReactNode } from 'react';
import { Act } from './act';
import { useModal } from './use-modal';

export interface QuestionProps {
  isOpen: boolean;
  /** "Withdraw lot 17, Wed 9:00–11:00 am?" */
  title: ReactNode;
  /** Who is told, and what cannot be taken back. */
  children: ReactNode;
  /** The act that changes nothing: "Keep the visit". It has the focus first. */
  keepWord: string;
  /** The act itself: "Withdraw". */
  endWord: string;
  onKeep: () => void;
  onEnd: () => void;
  /** `first` for a question before an act that ends nothing, such as a test that will be short. */
  endKind?: 'ending' | 'first';
  busy?: boolean;
  /** Why the answer did not go through. */
  error?: ReactNode;
}

/** One question before an end: a modal dialog that says who is told. Escape keeps. */
export function Question(props: QuestionProps): ReactNode {
  const { isOpen, title, children, keepWord, endWord, onKeep, onEnd, endKind = 'ending', busy, error } = props;
  const id = useId();
  const dialog = useModal(isOpen);
  useEffect(() => {
    if (isOpen) dialog.current?.querySelector<HTMLButtonElement>('.acts button')?.focus();
  }, [isOpen, dialog]);
  if (!isOpen) return null;
  return (
    <dialog
      ref={dialog}
      className="question"
      aria-labelledby={`${id}-title`}
      aria-describedby={`${id}-told`}
      onCancel={(event) => {
        event.preventDefault();
        if (!busy) onKeep();
      }}
    >
      <div className="told">
        <h2 className="h2" id={`${id}-title`}>
          {title}
        </h2>
        <div className="s mid" id={`${id}-told`}>
          {children}
        </div>
        {error ? (
          <p className="field-error" role="alert">
            {error}
          </p>
        ) : null}
      </div>
      <div className="acts">
        <Act onClick={() => (busy ? undefined : onKeep())}>{keepWord}</Act>
        <Act kind={endKind} busy={busy} onClick={onEnd}>
          {endWord}
        </Act>
      </div>
    </dialog>
  );
}
