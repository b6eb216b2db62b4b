import type { Comment } from '@holdwater/shared-types/threads/thread.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { Act } from '../../../components/act';
import { Lines } from '../../../components/lines';
import { Mark } from '../../../components/mark';
import { Numeral } from '../../../components/numeral';
import { Plain } from '../../../components/plain';
import { TimeRule, TimeRuleDay, TimeRuleEntry, TimeRuleSilence } from '../../../drawings/time-rule';
import { Failed } from '../../../lib/query-state';
import { useMe } from '../../../lib/session-context';
import { useTimeWords } from '../../../lib/time';
import { ledgerMark } from '../ledger-marks';
import { useLedgerWords } from '../ledger-words';
import type { ThreadLine } from '../thread-lines';
import type { Thread } from '../use-thread';

export interface ThreadRuleProps {
  thread: Thread;
  zone: string;
}

/** A lot's thread hung on a rule of time: words at full weight, what changed as thin lines, long silences dimensioned. */
export function ThreadRule({ thread, zone }: ThreadRuleProps): ReactNode {
  const { t } = useTranslation('threads');
  if (thread.error !== null) return <Failed error={thread.error} onRetry={thread.retry} />;
  if (thread.lines === null) return <Lines rows={6} />;
  if (thread.lines.length === 0 && !thread.hasEarlier) {
    return (
      <Plain kind="empty" title={t('empty.title')}>
        {t('empty.text')}
      </Plain>
    );
  }
  return (
    <>
      {thread.hasEarlier ? (
        <div className="more-row">
          <Act size="sm" busy={thread.isFetchingEarlier} busyWord={t('reading')} onClick={thread.showEarlier}>
            {t('earlier')}
          </Act>
        </div>
      ) : null}
      <TimeRule label={t('rule')}>
        {thread.lines.map((line) => (
          <Line key={line.key} line={line} zone={zone} />
        ))}
      </TimeRule>
    </>
  );
}

function Line({ line, zone }: { line: ThreadLine; zone: string }): ReactNode {
  const time = useTimeWords();
  const words = useLedgerWords();
  switch (line.kind) {
    case 'day':
      return <TimeRuleDay day={time.date(line.date)} />;
    case 'silence':
      return <TimeRuleSilence text={time.duration(line.minutes)} />;
    case 'words':
      return (
        <TimeRuleEntry time={time.clock(line.at, zone)} at={line.at}>
          <Words comment={line.comment} sequence={line.sequence} />
        </TimeRuleEntry>
      );
    case 'entry': {
      const mark = ledgerMark(line.entry);
      const { actorName, sequence } = line.entry;
      return (
        <TimeRuleEntry time={time.clock(line.at, zone)} at={line.at} isThin>
          <div className="thread-entry">
            {mark === null ? null : <Mark name={mark} />}
            <span className="grow">
              <Numeral text={words(line.entry, zone)} />
              {actorName === null ? null : <span className="mut"> {actorName}</span>}
            </span>
            <span className="n mut">{sequence}</span>
          </div>
        </TimeRuleEntry>
      );
    }
  }
}

function Words({ comment, sequence }: { comment: Comment; sequence: number | null }): ReactNode {
  const { t } = useTranslation(['threads', 'common']);
  const me = useMe();
  const onWords = useOnWords();
  const isOwn = comment.authorId === me.id;
  const role = comment.authorRole === null ? null : t(`common.roles.${comment.authorRole}`).toLocaleLowerCase();
  return (
    <>
      <div className="spread">
        <span>
          <span className="b">{isOwn ? t('you') : comment.authorName}</span>
          {role === null || isOwn ? null : <span className="mut"> {role}</span>}
        </span>
        {sequence === null ? null : <span className="n s mut">{sequence}</span>}
      </div>
      {comment.on === null ? null : <p className="s mid">{onWords(comment.on)}</p>}
      <p className="thread-words">{comment.text}</p>
    </>
  );
}

/** What a comment hangs on: "on correction 1", "on Water, test 2", "on the visit of Wed, Apr 15". */
function useOnWords(): (on: NonNullable<Comment['on']>) => string {
  const { t } = useTranslation(['threads', 'common', 'holds']);
  const time = useTimeWords();
  return ({ kind, label }) => {
    if (kind === 'correction') return t('on.correction', { number: label });
    if (kind === 'visit') return t('on.visit', { day: /^\d{4}-\d\d-\d\d$/.test(label) ? time.date(label) : label });
    const [system = '', ordinal = ''] = label.split(' ');
    const name = system === 'dwv' || system === 'water' ? t(`common.systems.${system}`) : system;
    return t('on.hold', { test: t('holds.testName', { system: name, test: t('common.test', { ordinal }) }) });
  };
}
