import { renderHook } from '@testing-library/react';
import i18next from 'i18next';
import { afterEach, describe, expect, it } from 'vitest';
import { changeLanguage } from '../../lib/i18n';
import { analyseTest } from './test-analysis';
import { atHour, stories, storyTerms, storyTest, zone, type Story, type StoryName } from './testing/told-stories';
import { useVerdictWords, type VerdictWords } from './use-verdict-words';

function wordsOf({ test, terms }: Story, hour = 31.4, units: 'us' | 'metric' = 'us'): VerdictWords {
  const analysis = analyseTest(test, terms);
  if (analysis === null) throw new Error('nothing to work out');
  const { result } = renderHook(() => useVerdictWords());
  return result.current({ test, analysis, terms, zone, units, now: new Date(atHour(hour)) });
}

const told = (name: StoryName): VerdictWords => wordsOf(stories[name]);
const leak = /leak|fuga/i;

afterEach(async () => {
  await changeLanguage('en');
});

// The stories are of the trade (common practice, no published source); what air does in the cold is P/T of the absolute values.
describe('the eight told stories', () => {
  it('sound: it holds, and how far it fell', () => {
    expect(told('sound')).toMatchObject({
      kind: 'holds',
      mark: 'test-holds',
      headline: 'It holds.',
      // 119.5 less 0.04 an hour (the median of the pairs), give or take half a mark and a mark in 14 h
      expects: 'About 119 psi (118–121) at 9:00 am.',
      since: 'Down 0.5 psi since Tue, Apr 14, 5:00 pm.',
      gauge: null,
    });
  });

  it('slow leak: losing, in whole marks of the gauge', () => {
    // 14 psi in 14 h is one mark an hour
    expect(told('slowLeak')).toMatchObject({
      kind: 'losing',
      headline: 'Losing about 1 psi an hour: look for a leak.',
    });
  });

  it('a cold night under air: temperature explains it', () => {
    expect(told('coldNight')).toMatchObject({
      kind: 'temperature',
      headline: 'Temperature explains the fall. It holds.',
    });
  });

  it('fresh plastic settling: not counted, then it holds', () => {
    const { test, terms } = stories.freshPex;
    const evening = { test: { ...test, readings: test.readings.slice(0, 3) }, terms };
    expect(wordsOf(evening, 17.7)).toMatchObject({
      kind: 'settling',
      headline: 'Pipe stretching: not counted until 5:52 pm.',
    });
    expect(told('freshPex')).toMatchObject({ kind: 'holds', since: 'Down 1 psi since Tue, Apr 14, 6:04 pm.' });
  });

  it('a leaky gauge on a tight house: it holds, the gauge is the second line', () => {
    expect(told('gaugeLeaks')).toMatchObject({
      kind: 'holds',
      gauge: {
        mark: 'test-gauge',
        text: 'The needle jumped from 108 to 112.5 psi when the valve was opened: the gauge leaks, not the house.',
      },
    });
  });

  it('a leaky house behind a shut valve: losing, the house and not the gauge', () => {
    expect(told('houseLeaks').kind).toBe('losing');
    expect(told('houseLeaks').gauge?.text).toContain('the house, not the gauge');
  });

  it('topped up twice: judged from the last time on, and topping is said to hide a leak', () => {
    const analysis = analyseTest(stories.toppedUpTwice.test, stories.toppedUpTwice.terms);
    expect(analysis?.toppedUpAt).toBe(atHour(18.1).replace('.000Z', 'Z'));
    expect(analysis?.cautions).toContainEqual({ code: 'many-top-ups', params: { topUps: 2 } });
    expect(told('toppedUpTwice').kind).toBe('holds');
  });

  it('one reading at 5 pm for 9 am: pump to be safe, and when to read for the trend', () => {
    // 51 psi at 61 °F, 12.228 psia: (63.228 × 506.67 ÷ 520.67) − 12.228 = 49.3 psi at 47 °F
    expect(wordsOf(stories.oneReading, 17.2)).toMatchObject({
      kind: 'short',
      headline: 'Pump to 53 psi to be safe.',
      expects: 'About 49 psi (48–51) at Wed, Apr 15, 9:00 am, 47 °F.',
      basis: 'One reading: read again after 8:45 pm to know the trend.',
    });
  });

  it('calls no sound story a leak, in either language', async () => {
    const sound: StoryName[] = ['sound', 'coldNight', 'freshPex', 'toppedUpTwice', 'oneReading'];
    for (const locale of ['en', 'es'] as const) {
      await changeLanguage(locale);
      for (const name of sound) {
        const { headline, expects, since, basis, gauge } = told(name);
        expect([headline, expects, since, basis, gauge?.text].join(' ')).not.toMatch(leak);
      }
      expect(told('slowLeak').headline).toMatch(leak);
      expect(told('houseLeaks').headline).toMatch(leak);
    }
  });

  it('speaks Spanish', async () => {
    await changeLanguage('es');
    expect(i18next.language).toBe('es');
    expect(wordsOf(stories.oneReading, 17.2).headline).toBe('Bombee a 53 psi para estar seguro.');
  });
});

describe('a headline', () => {
  it('over the lowest-rated part stands alone', () => {
    const over = wordsOf({
      test: storyTest([
        [17, 120, 60],
        [18, 127, 60],
      ]),
      terms: storyTerms(),
    });
    expect(over).toMatchObject({ kind: 'over', expects: null, since: null, basis: null, gauge: null });
    expect(over.headline).toContain('let it down to 126 psi now');
  });

  it('tells a fall slower than a mark an hour as the time of one mark', () => {
    const slow = wordsOf({
      test: storyTest([
        [17, 120, 60],
        [20, 119, 60],
        [26, 117, 60],
        [31, 115.333, 60],
      ]),
      terms: storyTerms(),
    });
    expect(slow.headline).toBe('Losing about 1 psi in 3 hours: look for a leak.');
  });

  it('says both of plastic that falls slowly', () => {
    const test = storyTest([
      [14, 120, 60],
      [17, 120, 60],
      [21, 119, 60],
      [26, 118, 60],
      [31, 117, 60],
    ]);
    expect(wordsOf({ test, terms: storyTerms({ isPlastic: true }) })).toMatchObject({
      kind: 'slow-fall',
      headline: 'Down about 3 psi in 14 h: plastic stretching, or a very small leak.',
    });
  });

  it('says what is not to be pumped higher', () => {
    const test = storyTest([[17, 100, 61]], { medium: 'air', ceilingPsi: 101 });
    expect(wordsOf({ test, terms: storyTerms({}, 41) }).headline).toContain(
      'more would pass the lowest-rated part, 101 psi',
    );
  });

  it('without a window expects nothing of it', () => {
    const { test } = stories.sound;
    expect(wordsOf({ test, terms: storyTerms({ forecast: null }) })).toMatchObject({
      kind: 'holds',
      headline: 'It holds so far. No window is booked.',
      expects: null,
    });
  });

  it('tells of the gauge alone while only shut readings stand', () => {
    const shut = wordsOf({ test: storyTest([[17, 120, 60, 'shut']]), terms: storyTerms() });
    expect(shut).toMatchObject({
      kind: 'few',
      headline: 'Open the gauge valve and read: nothing tells of the pipe yet.',
    });
  });

  it('is in the reader’s units, never finer than the gauge', () => {
    // 53 psi is 365.4 kPa (NIST SP 811); a mark of 1 psi is 6.9 kPa, so whole tens, and up
    expect(wordsOf(stories.oneReading, 17.2, 'metric').headline).toBe('Pump to 370 kPa to be safe.');
  });
});
