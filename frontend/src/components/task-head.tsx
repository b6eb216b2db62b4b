import type { ReactNode } from 'react';
import { useIsPhone } from '../lib/use-media';
import { Head, PhoneHead, type HeadCell } from './head';
import './task.css';

export interface TaskHeadProps {
  /** Where the arrow of the phone leads. */
  backTo?: string;
  onBack?: () => void;
  label: ReactNode;
  title: ReactNode;
  /** State at the right end, on both widths. */
  right?: ReactNode;
  cells?: readonly HeadCell[];
}

/** The head of a page on which one thing is done: the phone's with its arrow, a title block elsewhere. */
export function TaskHead({ backTo, onBack, label, title, right, cells }: TaskHeadProps): ReactNode {
  const isPhone = useIsPhone();
  if (isPhone) return <PhoneHead backTo={backTo} onBack={onBack} label={label} title={title} right={right} />;
  return <Head label={label} title={title} cells={cells} acts={right} />;
}

/** The acts of such a page, always at its foot: at the thumb on a phone. */
export function TaskFoot({ note, children }: { note?: ReactNode; children: ReactNode }): ReactNode {
  return (
    <div className="task-foot">
      {note ? <div className="note">{note}</div> : null}
      <div className="acts">{children}</div>
    </div>
  );
}
