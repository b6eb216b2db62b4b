import type { LedgerEntry } from '@holdwater/shared-types/ledger/ledger.contract.js';
import type { Comment } from '@holdwater/shared-types/threads/thread.contract.js';
import { localDateOf, minutesBetween } from '../../lib/local-days';

/** A silence longer than this is dimensioned. */
export const silenceMinutes = 6 * 60;

export type ThreadLine =
  | { readonly kind: 'day'; readonly key: string; readonly date: string }
  | { readonly kind: 'silence'; readonly key: string; readonly minutes: number }
  | {
      readonly kind: 'words';
      readonly key: string;
      readonly at: string;
      readonly comment: Comment;
      readonly sequence: number | null;
    }
  | { readonly kind: 'entry'; readonly key: string; readonly at: string; readonly entry: LedgerEntry };

type Timed = Extract<ThreadLine, { kind: 'words' | 'entry' }>;

export interface ThreadParts {
  readonly comments: readonly Comment[];
  readonly hasMoreComments: boolean;
  readonly entries: readonly LedgerEntry[];
  readonly hasMoreEntries: boolean;
  /** Only what people wrote. */
  readonly isWordsOnly: boolean;
  readonly zone: string;
}

/** The lines of a thread, oldest first: days, words, entries, and the silences between them. */
export function threadLines(parts: ThreadParts): ThreadLine[] {
  const timed = timedLines(parts);
  const lines: ThreadLine[] = [];
  timed.forEach((line, index) => {
    const before = timed[index - 1];
    if (before !== undefined) {
      const minutes = minutesBetween(before.at, line.at);
      if (minutes > silenceMinutes) lines.push({ kind: 'silence', key: `silence ${line.key}`, minutes });
    }
    const date = localDateOf(line.at, parts.zone);
    if (before === undefined || localDateOf(before.at, parts.zone) !== date) {
      lines.push({ kind: 'day', key: `day ${date} ${line.key}`, date });
    }
    lines.push(line);
  });
  return lines;
}

function timedLines({ comments, hasMoreComments, entries, hasMoreEntries, isWordsOnly }: ThreadParts): Timed[] {
  const sequenceOf = new Map(
    entries.filter(({ kind }) => kind === 'comment').map(({ payload, sequence }) => [payload['commentId'], sequence]),
  );
  const words = comments.map((comment): Timed => ({
    kind: 'words',
    key: comment.id,
    at: comment.at,
    comment,
    sequence: sequenceOf.get(comment.id) ?? null,
  }));
  if (isWordsOnly) return inOrder(words);
  // A comment's own entry is the comment itself.
  const changes = entries
    .filter(({ kind }) => kind !== 'comment')
    .map((entry): Timed => ({ kind: 'entry', key: String(entry.sequence), at: entry.at, entry }));
  const from = Math.max(hasMoreComments ? oldest(comments) : -Infinity, hasMoreEntries ? oldest(entries) : -Infinity);
  // What lies further back than both lists reach would show holes that are none.
  return inOrder([...words, ...changes]).filter(({ at }) => Date.parse(at) >= from);
}

function oldest(items: readonly { at: string }[]): number {
  return Math.min(...items.map(({ at }) => Date.parse(at)));
}

function inOrder(lines: readonly Timed[]): Timed[] {
  const place = (line: Timed): number => (line.kind === 'entry' ? line.entry.sequence : (line.sequence ?? Infinity));
  return [...lines].sort((a, b) => Date.parse(a.at) - Date.parse(b.at) || place(a) - place(b));
}
