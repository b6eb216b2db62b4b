import { fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { WeekRibbon, type RibbonDay } from './week-ribbon';

const dates = ['13', '14', '15', '16', '17', '20', '21', '22', '23', '24'];
const weekdays = ['Mon', 'Tue', 'Wed', 'Thu', 'Fri'];

function twoWeeks(): RibbonDay[] {
  return dates.map((date, index) => ({
    date: `2026-04-${date}`,
    label: `${weekdays[index % 5]}, Apr ${date}`,
    shelves: [{ from: 9, to: 11, label: '9:00–11:00' }],
    marks: index === 2 ? [9.2, 9.8, 10.1, 10.4].map((at) => ({ at, mark: 'booked' as const })) : [],
    notUp: index === 2 ? 2 : 0,
    isToday: index === 1,
    isBracketed: index === 2,
    isClosed: index === 9,
  }));
}

function show(form: 'desk' | 'phone' = 'desk'): { pick: ReturnType<typeof vi.fn>; move: ReturnType<typeof vi.fn> } {
  const [pick, move] = [vi.fn<(date: string) => void>(), vi.fn<(weeks: number) => void>()];
  render(<WeekRibbon days={twoWeeks()} nowFraction={0.5} form={form} onPick={pick} onMove={move} />);
  return { pick, move };
}

// Names as the interface guide pins them, section 8: "Wed, Apr 15, 4 visits, 2 not up".
describe.each(['desk', 'phone'] as const)('WeekRibbon, %s', (form) => {
  it('reads a day with its visits and what is not up', () => {
    show(form);
    expect(screen.getByRole('button', { name: 'Wed, Apr 15, 4 visits, 2 not up' })).toHaveAttribute(
      'aria-pressed',
      'true',
    );
    expect(screen.getByRole('button', { name: 'Tue, Apr 14, today, 0 visits' })).toHaveAttribute(
      'aria-current',
      'date',
    );
    expect(screen.getByRole('button', { name: 'Fri, Apr 24, closed' })).toBeVisible();
  });

  it('walks by arrow, picks by Enter or click', async () => {
    const { pick } = show(form);
    const wednesday = screen.getByRole('button', { name: /Wed, Apr 15/ });
    wednesday.focus();
    await userEvent.keyboard('{ArrowRight}');
    expect(screen.getByRole('button', { name: /Thu, Apr 16/ })).toHaveFocus();
    await userEvent.keyboard('{Enter}');
    expect(pick).toHaveBeenLastCalledWith('2026-04-16');
    await userEvent.keyboard('{Home}');
    expect(screen.getByRole('button', { name: /Mon, Apr 13/ })).toHaveFocus();
    await userEvent.click(wednesday);
    expect(pick).toHaveBeenLastCalledWith('2026-04-15');
  });

  it('has one stop for Tab among its days: the day the page covers', () => {
    show(form);
    const stops = screen.getAllByRole('button').filter((one) => one.classList.contains('day') && one.tabIndex === 0);
    expect(stops).toHaveLength(1);
    expect(stops[0]).toHaveAccessibleName('Wed, Apr 15, 4 visits, 2 not up');
  });

  it('moves weeks past an end, by page keys and by a drag, and a drag picks nothing', async () => {
    const { pick, move } = show(form);
    const monday = screen.getByRole('button', { name: /Mon, Apr 13/ });
    monday.focus();
    await userEvent.keyboard('{ArrowLeft}');
    expect(move).toHaveBeenLastCalledWith(-1);
    await userEvent.keyboard('{PageDown}');
    expect(move).toHaveBeenLastCalledWith(1);
    fireEvent.pointerDown(monday, { clientX: 300 });
    fireEvent.pointerUp(monday, { clientX: 120 });
    fireEvent.click(monday);
    expect(move).toHaveBeenCalledTimes(3);
    expect(move.mock.lastCall?.[0]).toBeGreaterThan(0);
    expect(pick).not.toHaveBeenCalled();
  });
});

describe('WeekRibbon at the desk', () => {
  it('keeps the weekday when Page Down goes a week on', async () => {
    const week = (from: number): RibbonDay[] =>
      Array.from({ length: 10 }, (_, index) => ({
        date: `2026-06-${String(from + index).padStart(2, '0')}`,
        label: `day ${from + index}`,
        shelves: [],
        marks: [],
        notUp: 0,
      }));
    const { rerender } = render(<WeekRibbon days={week(1)} onPick={vi.fn()} onMove={() => rerender(later)} />);
    const later = <WeekRibbon days={week(6)} onPick={vi.fn()} onMove={vi.fn()} />;
    screen.getByRole('button', { name: /^day 10,/ }).focus();
    await userEvent.keyboard('{PageDown}');
    expect(screen.getByRole('button', { name: /^day 15,/ })).toHaveFocus();
  });

  it('moves a week by its end arrows', async () => {
    const { move } = show();
    await userEvent.click(screen.getByRole('button', { name: 'One week later' }));
    await userEvent.click(screen.getByRole('button', { name: 'One week earlier' }));
    expect(move.mock.calls).toEqual([[1], [-1]]);
  });

  it('draws a window where its hours are: 9 to 11 of 7 to 17 is from a fifth on, a fifth wide', () => {
    show();
    const shelf = document.querySelector<HTMLElement>('.shelf');
    expect(shelf?.style.left).toBe('20%');
    expect(shelf?.style.width).toBe('20%');
  });
});
