import type { Medium } from '@holdwater/shared-types/holds/hold.states.js';
import type { AnalysedReading, AnalysedTest, TestTerms } from '../test-analysis';

/** Clock on Tue, Apr 14 (hours past 24: Wed, Apr 15) in Denver, psi, °F, valve. */
export type StoryRow = readonly [hour: number, psi: number, temperatureF: number | null, valve?: 'open' | 'shut'];

/** Midnight of Tue, Apr 14, 2026 in Denver, UTC−6 (IANA tz). */
const midnightMs = Date.parse('2026-04-14T06:00:00Z');
export const zone = 'America/Denver';
export const atHour = (hour: number): string => new Date(midnightMs + Math.round(hour * 3_600_000)).toISOString();

export function storyTest(rows: readonly StoryRow[], parts: Partial<AnalysedTest> = {}): AnalysedTest {
  const readings = rows.map(([hour, pressurePsi, temperatureF, gaugeValve = 'open']): AnalysedReading => ({
    at: atHour(hour),
    receivedAt: atHour(hour),
    pressurePsi,
    levelIn: null,
    temperatureF,
    gaugeValve,
    isStruck: false,
  }));
  const medium: Medium = 'water';
  return {
    ...{ system: 'water', medium, tape: null, gauge: { rangePsi: 160, incrementPsi: 1 } },
    ...{ ceilingPsi: 126, minimumPsi: 100, settleMinutes: 60, readings },
    ...parts,
  };
}

/** Wed, Apr 15, 9:00–11:00 am, 5000 ft up, copper unless told otherwise. */
export function storyTerms(parts: Partial<TestTerms> = {}, temperatureF: number | null = null): TestTerms {
  return {
    ...{ elevationFt: 5000, standMinutes: 15, isPlastic: false },
    forecast: { from: atHour(33), to: atHour(35), temperatureF, coldestF: null },
    ...parts,
  };
}

export interface Story {
  readonly test: AnalysedTest;
  readonly terms: TestTerms;
}

const air = { medium: 'air', ceilingPsi: 80, minimumPsi: 50, gauge: { rangePsi: 100, incrementPsi: 1 } } as const;

/** 6:45:10 and 6:45:40 am of the next day. */
const [shutAt, openedAt] = [30 + 2710 / 3600, 30 + 2740 / 3600];

/** The eight told stories of a test left standing overnight. Invented logs; the air ones follow P/T of the absolute values. */
export const stories = {
  sound: {
    test: storyTest([
      [17, 120, 60],
      [20, 120, 60],
      [31, 119.5, 60],
    ]),
    terms: storyTerms(),
  },
  slowLeak: {
    test: storyTest([
      [17, 120, 60],
      [19, 118, 60],
      [22, 115, 60],
      [31, 106, 60],
    ]),
    terms: storyTerms(),
  },
  // 60 psi at 61 °F and 12.228 psi of atmosphere is 57.2 psi at 41 °F
  coldNight: {
    test: storyTest(
      [
        [17, 60, 61],
        [21, 59, 53],
        [31, 57, 41],
      ],
      air,
    ),
    terms: storyTerms({}, 47),
  },
  freshPex: {
    test: storyTest([
      [16.87, 118, 58],
      [17.13, 116, 58],
      [17.67, 114, 58],
      [18.08, 113, 58],
      [20.5, 113, 57],
      [31.3, 112, 56],
    ]),
    terms: storyTerms({ isPlastic: true }),
  },
  gaugeLeaks: {
    test: storyTest([
      [17, 113, 58],
      [20.5, 113, 58],
      [shutAt, 108, 58, 'shut'],
      [openedAt, 112.5, 58],
      [31.3, 112.5, 58],
    ]),
    terms: storyTerms(),
  },
  houseLeaks: {
    test: storyTest([
      [17, 113, 58],
      [17.5, 113, 58],
      [shutAt, 104, 58, 'shut'],
      [openedAt, 104, 58],
      [31.3, 104, 58],
    ]),
    terms: storyTerms(),
  },
  toppedUpTwice: {
    test: storyTest([
      [15, 110, 60],
      [16, 106, 60],
      [16.1, 120, 60],
      [18, 116, 60],
      [18.1, 121, 60],
      [21, 121, 60],
      [31, 120.5, 60],
    ]),
    terms: storyTerms(),
  },
  oneReading: { test: storyTest([[17.17, 51, 61]], air), terms: storyTerms({}, 47) },
} satisfies Record<string, Story>;
export type StoryName = keyof typeof stories;
