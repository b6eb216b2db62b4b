import { describe, expect, it } from 'vitest';
import { refusedByReason, reasonsFor, upByFor } from './offer-reasons';
import { offerOf, zone } from './testing/visits.sample';

// When tests must be up: definitions.md, "Rule card", readiness: by a clock time or hours before the window.
describe('when the tests must be up', () => {
  const window = offerOf('2026-04-16', 'mid');
  it('is a clock time of the window’s day on the department’s clock', () => {
    expect(upByFor({ kind: 'clock-time', time: '07:00' }, window, zone)).toBe('2026-04-16T13:00:00Z');
  });
  it('is never after the window has begun', () => {
    expect(upByFor({ kind: 'clock-time', time: '12:00' }, window, zone)).toBe(window.startAt);
  });
  it('is hours before the window', () => {
    expect(upByFor({ kind: 'hours-before', hours: 2 }, window, zone)).toBe('2026-04-16T13:00:00.000Z');
  });
});

describe('reasons of an offer', () => {
  const context = { lots: 2, firstDate: '2026-04-16', zone, booking: 'self', upBy: null } as const;
  it('speak for room and the first day, against a later one', () => {
    expect(reasonsFor(offerOf('2026-04-16', 'mid'), context).every(({ isFor }) => isFor)).toBe(true);
    const later = reasonsFor(offerOf('2026-04-18', 'mid'), context);
    expect(later.find(({ isFor }) => !isFor)).toEqual({ code: 'laterDays', isFor: false, count: 2 });
  });
  it('say that it is only a wish where the desk places', () => {
    const codes = reasonsFor(offerOf('2026-04-16', 'mid'), { ...context, booking: 'desk' }).map(({ code }) => code);
    expect(codes).toContain('deskPlaces');
  });
});

it('refused windows are told by their reason', () => {
  const full = { isTakeable: false, whyNot: 'full' } as const;
  const groups = refusedByReason([
    offerOf('2026-04-16', 'mid', full),
    offerOf('2026-04-16', 'late'),
    offerOf('2026-04-17', 'mid', full),
    offerOf('2026-04-18', 'mid', { isTakeable: false, whyNot: 'closed' }),
  ]);
  expect(groups.map(({ why, windows }) => [why, windows.length])).toEqual([
    ['full', 2],
    ['closed', 1],
  ]);
});
