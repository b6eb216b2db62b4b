import { noticeKinds } from '@holdwater/shared-types/notices/notice.contract.js';
import { describe, expect, it } from 'vitest';
import { noticeRules, recipientsOf } from './notice.rules.js';

const people = {
  superintendents: ['della'],
  plumbers: ['ruben', 'ida'],
  inspector: ['noor'],
  desk: ['wes'],
  opener: ['noor'],
  asked: ['ida'],
};

describe('who is told of what', () => {
  it('has a rule for every kind of notice', () => {
    expect(Object.keys(noticeRules).sort()).toEqual([...noticeKinds].sort());
  });

  it('invites all three parties to a booking, the one who booked too, but tells that one nothing on the page', () => {
    const told = recipientsOf('visit-booked', people, 'della', true);
    expect(Object.fromEntries(told)).toEqual({
      della: { page: false, email: true },
      ruben: { page: true, email: true },
      ida: { page: true, email: true },
      noor: { page: true, email: true },
      wes: { page: true, email: false },
    });
  });

  it('mails a fix only while no visit is near', () => {
    expect(recipientsOf('correction-fixed', people, 'ruben', true).get('noor')).toEqual({ page: true, email: false });
    expect(recipientsOf('correction-fixed', people, 'ruben', false).get('noor')).toEqual({ page: true, email: true });
  });

  it('tells nobody of their own act where no calendar is concerned', () => {
    for (const kind of noticeKinds) {
      if (noticeRules[kind].calendar) continue;
      for (const id of ['della', 'ruben', 'noor', 'wes'])
        expect(recipientsOf(kind, people, id, false).has(id)).toBe(false);
    }
  });
});
