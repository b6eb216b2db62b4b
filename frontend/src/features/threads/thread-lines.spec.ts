import type { LedgerEntry } from '@holdwater/shared-types/ledger/ledger.contract.js';
import type { Comment } from '@holdwater/shared-types/threads/thread.contract.js';
import { describe, expect, it } from 'vitest';
import { threadLines, type ThreadParts } from './thread-lines';

const comment = (id: string, at: string): Comment => ({
  id,
  lotId: 'lot',
  text: id,
  on: null,
  authorId: 'a',
  authorName: 'Ruben Achterberg',
  authorRole: 'plumber',
  at,
  receivedAt: at,
});
const entry = (sequence: number, at: string, kind = 'test-up', payload = {}): LedgerEntry => ({
  sequence,
  at,
  kind,
  actorName: null,
  actorRole: null,
  payload,
  hash: '',
});
const parts = (more: Partial<ThreadParts>): ThreadParts => ({
  comments: [],
  hasMoreComments: false,
  entries: [],
  hasMoreEntries: false,
  isWordsOnly: false,
  zone: 'America/Denver',
  ...more,
});
const shape = (given: ThreadParts): string[] =>
  threadLines(given).map((line) => {
    if (line.kind === 'day') return line.date;
    if (line.kind === 'silence') return `${line.minutes} min`;
    return line.kind === 'words' ? `words ${line.comment.id} ${line.sequence}` : `entry ${line.entry.sequence}`;
  });

describe('the lines of a thread', () => {
  it('stand oldest first, under their days, a comment with the number of its entry', () => {
    const given = parts({
      comments: [comment('second', '2026-04-15T13:24:00Z'), comment('first', '2026-04-15T13:20:00Z')],
      entries: [
        entry(4, '2026-04-15T13:24:01Z', 'comment', { commentId: 'second' }),
        entry(3, '2026-04-15T13:22:00Z'),
        entry(2, '2026-04-15T13:20:01Z', 'comment', { commentId: 'first' }),
      ],
    });
    expect(shape(given)).toEqual(['2026-04-15', 'words first 2', 'entry 3', 'words second 4']);
  });

  it('dimension a silence over six hours and no shorter one', () => {
    // 5:08 pm to 6:45 am in Mountain Time is 13 h 37 min, as on the drawing of the thread.
    const given = parts({
      entries: [entry(3, '2026-04-15T18:45:00Z'), entry(2, '2026-04-15T12:45:00Z'), entry(1, '2026-04-14T23:08:00Z')],
    });
    expect(shape(given)).toEqual(['2026-04-14', 'entry 1', '817 min', '2026-04-15', 'entry 2', 'entry 3']);
  });

  it('change day at midnight of the department, not of the reader', () => {
    const given = parts({ entries: [entry(2, '2026-04-15T06:30:00Z'), entry(1, '2026-04-15T05:30:00Z')] });
    expect(shape(given)).toEqual(['2026-04-14', 'entry 1', '2026-04-15', 'entry 2']);
  });

  it('leave out what changed when only words are wanted', () => {
    const given = parts({
      comments: [comment('first', '2026-04-15T13:20:00Z')],
      entries: [entry(3, '2026-04-15T13:22:00Z')],
      isWordsOnly: true,
    });
    expect(shape(given)).toEqual(['2026-04-15', 'words first null']);
  });

  it('show nothing further back than both lists reach', () => {
    const given = parts({
      comments: [comment('old', '2026-04-01T13:00:00Z')],
      entries: [entry(9, '2026-04-15T13:22:00Z')],
      hasMoreEntries: true,
    });
    expect(shape(given)).toEqual(['2026-04-15', 'entry 9']);
  });
});
