import { act, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { DoneLine, sayDone } from './done-line';
import { Field } from './field';
import { Lines } from './lines';
import { NoteLines } from './note-lines';
import { Numeral } from './numeral';
import { Plain } from './plain';
import { Question } from './question';
import { Slip } from './slip';

afterEach(() => vi.useRealTimers());

describe('Lines', () => {
  it('shows nothing at first, lines after 300 ms, words after 8 s', () => {
    vi.useFakeTimers();
    const { container } = render(<Lines slowWords="Still reading. The lot file is large." />);
    expect(container.querySelectorAll('.lines-row')).toHaveLength(0);
    act(() => {
      vi.advanceTimersByTime(300);
    });
    expect(container.querySelectorAll('.lines-row')).toHaveLength(4);
    expect(screen.queryByText(/Still reading/)).toBeNull();
    act(() => {
      vi.advanceTimersByTime(7700);
    });
    expect(screen.getByText(/Still reading/)).toBeVisible();
  });
});

describe('DoneLine', () => {
  it('says it politely for six seconds, and longer while pointed at', () => {
    vi.useFakeTimers();
    render(
      <MemoryRouter>
        <DoneLine />
      </MemoryRouter>,
    );
    const place = screen.getByRole('status');
    expect(place).toHaveAttribute('aria-live', 'polite');
    act(() => {
      sayDone({ mark: 'booked', title: '3 visits booked' });
    });
    fireEvent.pointerEnter(place);
    act(() => {
      vi.advanceTimersByTime(20_000);
    });
    expect(place).toHaveTextContent('3 visits booked');
    fireEvent.pointerLeave(place);
    act(() => {
      vi.advanceTimersByTime(5_999);
    });
    expect(place).toHaveTextContent('3 visits booked');
    act(() => {
      vi.advanceTimersByTime(1);
    });
    expect(place).toBeEmptyDOMElement();
  });
});

describe('Question', () => {
  it('puts the focus on the act that changes nothing; Escape keeps', async () => {
    const [keep, end] = [vi.fn(), vi.fn()];
    render(
      <Question isOpen title="Withdraw lot 17?" keepWord="Keep the visit" endWord="Withdraw" onKeep={keep} onEnd={end}>
        Ruben and Noor are told at once.
      </Question>,
    );
    const dialog = screen.getByRole('dialog', { name: 'Withdraw lot 17?' });
    expect(dialog).toHaveAccessibleDescription('Ruben and Noor are told at once.');
    expect(screen.getByRole('button', { name: 'Keep the visit' })).toHaveFocus();
    fireEvent(dialog, new Event('cancel', { cancelable: true }));
    expect(keep).toHaveBeenCalledTimes(1);
    await userEvent.click(screen.getByRole('button', { name: 'Withdraw' }));
    expect(end).toHaveBeenCalledTimes(1);
  });
});

describe('Field', () => {
  it('names its control and says what is wrong, with the likely fix as an act', async () => {
    const use = vi.fn();
    render(<Field label="Gauge" unit="psi" error="This gauge goes to 160." fix={{ word: 'Use 112', onUse: use }} />);
    const input = screen.getByRole('textbox', { name: 'Gauge' });
    expect(input).toBeInvalid();
    expect(input).toHaveAccessibleDescription(/goes to 160/);
    await userEvent.click(screen.getByRole('button', { name: 'Use 112' }));
    expect(use).toHaveBeenCalled();
  });

  it('says optional, and gives the same to another control', () => {
    render(
      <Field label="Floor" isOptional hint="Where it is">
        {(control) => (
          <select {...control}>
            <option>Second</option>
          </select>
        )}
      </Field>,
    );
    expect(screen.getByRole('combobox', { name: 'Floor, optional' })).toHaveAccessibleDescription('Where it is');
  });
});

describe('Plain', () => {
  it('tells an error at once, with its entry number', () => {
    render(
      <Plain kind="error" title="The visit was not booked" entry="7f3-20c">
        Nothing was booked.
      </Plain>,
    );
    expect(screen.getByRole('alert')).toHaveTextContent(/was not booked.*Nothing was booked.*7f3-20c/);
  });
});

describe('NoteLines', () => {
  it('looks at one point at a time and opens a correction at it', async () => {
    const [look, correct] = [vi.fn(), vi.fn()];
    const lines = [
      { id: 'plates', text: 'Nail plates', isLookedAt: false },
      { id: 'slope', text: 'Slope', isLookedAt: true, correction: { number: 2, state: 'correction-open' as const } },
    ];
    render(<NoteLines label="The work" lines={lines} onLook={look} onCorrect={correct} />);
    await userEvent.click(screen.getByRole('checkbox', { name: 'Looked at: Nail plates', checked: false }));
    expect(look).toHaveBeenCalledExactlyOnceWith('plates', true);
    await userEvent.click(screen.getByRole('button', { name: 'Correction 2: Slope' }));
    expect(correct).toHaveBeenCalledExactlyOnceWith('slope');
  });
});

describe('Slip', () => {
  it('fills its glass with the share of systems standing', () => {
    const { container, rerender } = render(<Slip title="Lot 17" state="part-up" share={0.5} word="water not up" />);
    const height = (): string => container.querySelector<HTMLElement>('.glass > i')?.style.height ?? '';
    expect(height()).toBe('46%');
    rerender(<Slip title="Lot 17" state="ready" share={1} />);
    expect(height()).toBe('92%');
    expect(screen.getByText('test up')).toBeVisible();
  });
});

describe('Numeral', () => {
  it('sets numerals in Mono and leaves the sentence its comma', () => {
    const { container } = render(<Numeral text="Wed, Apr 15, 9:00–11:00 am" />);
    expect([...container.querySelectorAll('.n')].map((one) => one.textContent)).toEqual(['15', '9:00–11:00']);
    expect(container).toHaveTextContent('Wed, Apr 15, 9:00–11:00 am');
  });
});
