import { isAHoliday } from '@18f/us-federal-holidays';
import { Temporal } from 'temporal-polyfill';
import { describe, expect, it } from 'vitest';
import { departmentHolidays, observedFederalHolidays } from './federal-holidays.js';

/** Observed days: 5 U.S.C. 6103 and E.O. 11582 §3(a). */
const published: Record<number, string> = {
  2026: '1/1 1/19 2/16 5/25 6/19 7/3 9/7 10/12 11/11 11/26 12/25',
  2027: '1/1 1/18 2/15 5/31 6/18 7/5 9/6 10/11 11/11 11/25 12/24 12/31',
  2028: '1/17 2/21 5/29 6/19 7/4 9/4 10/9 11/10 11/23 12/25',
};

const shortDate = (date: string) => `${Number(date.slice(5, 7))}/${Number(date.slice(8))}`;
const datesOf = (year: number) => observedFederalHolidays(year).map(({ date }) => date);

/** Day by day through a year, by the independent library @18f/us-federal-holidays 4. */
function datesByLibrary(year: number): string[] {
  const dates: string[] = [];
  for (let day = Temporal.PlainDate.from({ year, month: 1, day: 1 }); day.year === year; day = day.add({ days: 1 })) {
    if (isAHoliday(new Date(`${day.toString()}T12:00:00Z`), { utc: true })) dates.push(day.toString());
  }
  return dates;
}

describe('federal holidays as observed', () => {
  it.each([2026, 2027, 2028])('%i: as published', (year) => {
    expect(datesOf(year).map(shortDate).join(' ')).toBe(published[year]);
  });

  it.each([2022, 2023, 2024, 2025, 2026, 2027, 2028, 2029, 2030, 2033, 2034])(
    '%i: as @18f/us-federal-holidays has it',
    (year) => {
      expect(datesOf(year)).toEqual(datesByLibrary(year));
    },
  );

  it('keeps Juneteenth from 2021 only (Pub. L. 117-17), and refuses years with another list', () => {
    expect(datesOf(2020)).not.toContain('2020-06-19');
    expect(datesOf(2021)).toContain('2021-06-18');
    expect(() => observedFederalHolidays(1985)).toThrow(RangeError);
  });
});

describe("a department's holidays", () => {
  it('start from the federal list, in order over several years', () => {
    expect(
      departmentHolidays(2026, 2028)
        .map(({ date }) => shortDate(date))
        .join(' '),
    ).toBe(`${published[2026]} ${published[2027]} ${published[2028]}`);
  });

  it('add days, and drop days and holidays', () => {
    const kept = departmentHolidays(2027, 2027, {
      addedDates: ['2027-11-26', '2027-10-11', '2028-11-24'],
      droppedDates: ['2027-12-31'],
      droppedHolidays: ['columbus-day', 'washingtons-birthday'],
    });
    expect(kept.map(({ date }) => shortDate(date)).join(' ')).toBe(
      '1/1 1/18 5/31 6/18 7/5 9/6 10/11 11/11 11/25 11/26 12/24',
    );
    expect(kept.find(({ date }) => date === '2027-10-11')?.code).toBeNull();
    expect(kept.find(({ date }) => date === '2027-11-25')?.code).toBe('thanksgiving-day');
  });

  it('refuse an added date that does not exist', () => {
    expect(() => departmentHolidays(2027, 2027, { addedDates: ['2027-02-29'] })).toThrow(RangeError);
  });
});
