import { z } from 'zod';
import { fieldWrite, id, instant } from '../common/fields.js';
import { pageOf, pageQuery } from '../common/paging.js';
import { route } from '../common/route.js';

export const commentLimit = 4000;
export const commentSubjects = ['visit', 'correction', 'hold'] as const;

export const comment = z.object({
  id,
  lotId: id,
  text: z.string(),
  on: z.object({ kind: z.enum(commentSubjects), id, label: z.string() }).nullable(),
  authorId: id,
  authorName: z.string(),
  /** The role it was written in, or null for an owner. */
  authorRole: z.string().nullable(),
  at: instant,
  receivedAt: instant,
});
export type Comment = z.infer<typeof comment>;

export const listComments = route({
  method: 'GET',
  path: '/api/lots/:lotId/comments',
  summary: 'The lot’s thread, newest first',
  status: 200,
  params: z.object({ lotId: id }),
  query: z.object(pageQuery),
  answer: pageOf(comment),
});

export const writeComment = route({
  method: 'POST',
  path: '/api/lots/:lotId/comments',
  summary: 'Write to all three parties',
  status: 201,
  params: z.object({ lotId: id }),
  body: z.strictObject({
    ...fieldWrite,
    text: z.string().trim().min(1, 'required').max(commentLimit, 'too-long'),
    on: z
      .strictObject({ kind: z.enum(commentSubjects), id })
      .nullable()
      .optional(),
  }),
  answer: comment,
});
