import { route } from '../common/route.js';
import { noticeAnswer, noticeInput } from './notice.contract.js';

/** Preview of the days and windows a request may ask for; keeps nothing. */
export const calcNotice = route({
  method: 'POST',
  path: '/api/calc/notice',
  summary: 'The days and windows open to a request',
  status: 200,
  body: noticeInput,
  answer: noticeAnswer,
});
