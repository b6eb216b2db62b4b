import { fireEvent, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { Cutaway, type CutawayHouse } from './cutaway';
import { drawHouse } from './cutaway-house';
import { runsOf } from './cutaway-runs';

/** The house of the mockups: plug 3 ft under the first floor, cut 21 ft and vent terminal 24.5 ft over it. */
const house: CutawayHouse = {
  floors: [
    { name: 'first', elevationFt: 0 },
    { name: 'second', elevationFt: 10 },
  ],
  lowestFittingFt: -2,
  ventTerminalFt: 24.5,
  atticCutFt: 21,
  standpipeFt: null,
  laundry: { floor: 'second', boxOutletFt: 13.5, branchFt: 10.8 },
  plugs: [{ name: 'building drain', elevationFt: -3, ratedPsi: 17, nominalIn: 4 }],
};

/** NIST SP 811, appendix B: foot of water, conventional, 2989.067 Pa; pound-force per square inch, 6894.757 Pa. */
const nistPsi = (feet: number): number => (feet * 2989.067) / 6894.757;

function twin(): string[][] {
  const rows = within(screen.getByRole('table')).getAllByRole('row').slice(1);
  return rows.map((row) => [...row.children].map((cell) => cell.textContent ?? ''));
}

describe('Cutaway', () => {
  it('tells head and pressure of every floor in words', () => {
    render(<Cutaway house={house} method="attic-cut" fillLevelFt={21} />);
    expect(screen.getByRole('img', { name: /water at 24.0 ft above the plug/ })).toBeVisible();
    // Heads as drawn in the mockup of the lot sheet.
    expect(twin().map(([place, , head]) => [place, head])).toEqual([
      ['Attic floor', '2.0'],
      ['Second floor', '11.0'],
      ['First floor', '21.0'],
      ['Test plug', '24.0'],
    ]);
    twin().forEach(([, , head, pressure]) => expect(Number(pressure)).toBeCloseTo(nistPsi(Number(head)), 1));
    expect(screen.getByText('Not under test: 24.0 to 27.5 ft above the plug')).toBeInTheDocument();
  });

  it('shows the answer of the plan where there is one', () => {
    const levels = [
      { name: 'second', elevationFt: 10, headFt: 11, pressurePsi: 4.7619 },
      { name: 'building drain', elevationFt: -3, headFt: 24, pressurePsi: 10.3895 },
    ];
    render(<Cutaway house={house} method="attic-cut" fillLevelFt={21} levels={levels} />);
    expect(twin().find(([place]) => place === 'Second floor')?.[3]).toBe('4.8');
    expect(twin().find(([place]) => place === 'Test plug')?.[3]).toBe('10.4');
  });

  it('has no attic under a standpipe: the house does not stand yet', () => {
    render(<Cutaway house={{ ...house, standpipeFt: 21 }} method="standpipe" fillLevelFt={21} />);
    expect(twin().map(([place, , head]) => [place, head])).toEqual([
      ['First floor', '21.0'],
      ['Test plug', '24.0'],
    ]);
  });

  it('tells the same in metres and kilopascals by choice', () => {
    render(<Cutaway house={house} method="attic-cut" fillLevelFt={21} units="metric" />);
    // NIST SP 811: a foot is 0.3048 m, a conventional foot of water 2.989067 kPa; 24 ft are 7.3 m and 71.7 kPa
    expect(screen.getByRole('columnheader', { name: 'Pressure, kPa' })).toBeInTheDocument();
    const plug = twin().find(([place]) => place === 'Test plug') ?? [];
    expect(plug[2]).toBe((24 * 0.3048).toFixed(1));
    expect(Math.abs(Number(plug[3]) - 24 * 2.989067)).toBeLessThan(0.6);
    expect(screen.getByRole('img', { name: /water at 7.3 m above the plug/ })).toBeVisible();
  });

  it('names each lift of a stack tested by sections', () => {
    const lifts = [
      { fromFt: -2, toFt: 14 },
      { fromFt: 4, toFt: 24.5 },
    ];
    render(<Cutaway house={house} method="sectional" fillLevelFt={24.5} lifts={lifts} />);
    expect(screen.getByText('Lift 1: 1.0 to 17.0 ft above the plug')).toBeInTheDocument();
    expect(screen.getByText('Lift 2: 7.0 to 27.5 ft above the plug')).toBeInTheDocument();
  });

  it('says nothing of heads without a method, and nothing is under water', () => {
    const { container } = render(<Cutaway house={house} method={null} fillLevelFt={null} />);
    expect(screen.queryByRole('table')).toBeNull();
    expect(container.querySelector('rect[fill="var(--brassFill)"]')).toBeNull();
  });

  it('leaves a floor above the level without head', () => {
    render(<Cutaway house={house} method="laundry-riser" fillLevelFt={2.3} />);
    expect(twin().find(([place]) => place === 'Second floor')?.[2]).toBe('0.0');
    expect(screen.getByText('Not under test: 5.3 to 27.5 ft above the plug')).toBeInTheDocument();
  });

  it('takes a place by the keyboard, in steps from the middle', async () => {
    const touch = vi.fn();
    render(<Cutaway house={house} method="attic-cut" fillLevelFt={21} onTouch={touch} />);
    screen.getByRole('button', { name: /Touch the place/ }).focus();
    await userEvent.keyboard('{ArrowRight}{ArrowRight}{ArrowUp}{Enter}');
    expect(touch).toHaveBeenLastCalledWith({ x: 0.54, y: 0.48 });
  });

  it('takes a place by touch as fractions of the frame', () => {
    const touch = vi.fn();
    render(<Cutaway house={house} method="attic-cut" fillLevelFt={21} onTouch={touch} />);
    const surface = screen.getByRole('button', { name: /Touch the place/ });
    vi.spyOn(surface, 'getBoundingClientRect').mockReturnValue(new DOMRect(100, 50, 400, 200));
    fireEvent.click(surface, { clientX: 200, clientY: 150 });
    expect(touch).toHaveBeenLastCalledWith({ x: 0.25, y: 0.5 });
  });
});

describe('runs of a house', () => {
  // IPC table 704.1 (from memory): pipe of 2 1/2 in or less falls at least 1/4 in per foot; the guide draws every drain so.
  it('every drain falls a quarter inch per foot toward stack and plug', () => {
    const drawn = drawHouse(house);
    const { runs } = runsOf(drawn, 'attic-cut', 24);
    const drain = runs[0]?.points ?? [];
    const [[x0 = 0, e0 = 0] = [], [x1 = 0, e1 = 0] = []] = drain;
    expect((e1 - e0) / (x1 - x0)).toBeCloseTo(1 / 48, 10);
  });

  // UPC 804.1 (from memory): a clothes washer standpipe's trap is roughed in 6 to 18 in above the floor.
  it('the laundry trap stands 6 to 18 in above its floor', () => {
    const drawn = drawHouse(house);
    const trap = runsOf(drawn, 'attic-cut', 24).runs.find((run) => run.trap?.riserFt === 9.8);
    const height = (trap?.points.at(-1)?.[1] ?? 0) - (drawn.floors[1]?.heightFt ?? 0);
    expect(height).toBeGreaterThanOrEqual(0.5);
    expect(height).toBeLessThanOrEqual(1.5);
  });

  it('stands a riser on the laundry branch up to its level, in place of the trap', () => {
    const drawn = drawHouse({ ...house, laundry: { floor: 'first', boxOutletFt: 3.5, branchFt: 0.9 } });
    const levelFt = 0.9 + 1.5 - drawn.datumFt;
    const { runs } = runsOf(drawn, 'laundry-riser', levelFt);
    const riser = runs.find(({ points }) => points.length === 3 && points[2]?.[0] === 9.8);
    expect(riser?.points[2]?.[1]).toBeCloseTo(levelFt + 0.4, 9);
    expect(runs.some(({ trap }) => trap?.riserFt === 9.8)).toBe(false);
  });

  it('keeps the vents of every house between its attic floor and its terminal', () => {
    const low: CutawayHouse = {
      ...house,
      floors: [{ name: 'first', elevationFt: 0 }],
      ventTerminalFt: 12,
      atticCutFt: null,
      laundry: null,
    };
    for (const one of [house, low]) {
      const drawn = drawHouse(one);
      expect(drawn.headerFt).toBeGreaterThan(drawn.atticFt);
      expect(drawn.headerFt).toBeLessThan(drawn.ventFt);
      expect(drawn.ridgeFt).toBeGreaterThan(drawn.atticFt);
    }
  });
});
