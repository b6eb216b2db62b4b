import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState, type ReactNode } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { Plat, type PlatLotShape } from './plat';
import { centroid, roomiestPoint, type PlatPoint } from './plat-geometry';

const square = (x: number, y: number, side = 60): PlatPoint[] => [
  [x, y],
  [x + side, y],
  [x + side, y + side],
  [x, y + side],
];

/** Four lots: 1 and 2 in a row, 3 under 1, 4 under 2. */
const lots: PlatLotShape[] = [
  { id: 'a', number: '1', polygon: square(0, 0), state: 'clear' },
  { id: 'b', number: '2', polygon: square(60, 0), state: 'under-test' },
  { id: 'c', number: '3', polygon: square(0, 100), state: 'corrections-open' },
  { id: 'd', number: '4', polygon: square(60, 100), state: 'not-tested' },
];

function ChosenPlat({ onOpen }: { onOpen: (id: string) => void }): ReactNode {
  const [chosen, setChosen] = useState<string | null>(null);
  return <Plat tract="Sorrel Bench" lots={lots} chosen={chosen} onChoose={setChosen} onOpen={onOpen} />;
}

const chosenLots = (): (string | null)[] =>
  screen.getAllByRole('option', { selected: true }).map((lot) => lot.getAttribute('aria-label'));

describe('Plat', () => {
  it('names each lot with its state', () => {
    render(<ChosenPlat onOpen={vi.fn()} />);
    expect(screen.getByRole('listbox', { name: 'Plat of Sorrel Bench, 4 lots' })).toBeVisible();
    expect(screen.getByRole('option', { name: 'Lot 3, corrections open' })).toBeVisible();
  });

  it('goes to the lot beside by arrow and opens by Enter', async () => {
    const open = vi.fn();
    render(<ChosenPlat onOpen={open} />);
    screen.getByRole('listbox').focus();
    await userEvent.keyboard('{ArrowRight}');
    expect(chosenLots()).toEqual(['Lot 1, clear']);
    await userEvent.keyboard('{ArrowRight}');
    expect(chosenLots()).toEqual(['Lot 2, under test']);
    await userEvent.keyboard('{ArrowDown}');
    expect(chosenLots()).toEqual(['Lot 4, not tested']);
    await userEvent.keyboard('{ArrowLeft}{Enter}');
    expect(open).toHaveBeenCalledExactlyOnceWith('c');
    await userEvent.keyboard('{ArrowLeft}');
    expect(chosenLots()).toEqual(['Lot 3, corrections open']);
  });

  it('points assistive readers at the chosen lot', async () => {
    render(<ChosenPlat onOpen={vi.fn()} />);
    await userEvent.click(screen.getByRole('option', { name: /Lot 2/ }));
    const active = screen.getByRole('listbox').getAttribute('aria-activedescendant');
    expect(document.getElementById(active ?? '')).toHaveAttribute('aria-label', 'Lot 2, under test');
  });
});

describe('plat geometry', () => {
  // The centroid of a triangle is the mean of its corners (Euclid's medians).
  it('finds the middle of a triangle and of a square', () => {
    const [x, y] = centroid([
      [0, 0],
      [9, 0],
      [0, 6],
    ]);
    expect([x, y]).toEqual([3, 2]);
    expect(centroid(square(10, 20))).toEqual([40, 50]);
  });

  // The inscribed circle of a right triangle with legs a, b and hypotenuse c has radius (a + b − c) / 2.
  it('puts a number where the most room is', () => {
    const triangle: PlatPoint[] = [
      [0, 0],
      [30, 0],
      [0, 40],
    ];
    expect(roomiestPoint(triangle).room).toBeGreaterThan(10 * 0.93);
    expect(roomiestPoint(triangle).room).toBeLessThanOrEqual(10 + 1e-9);
  });
});
