import { render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { analyseTest } from '../features/holds/test-analysis';
import { testChartOf } from '../features/holds/test-chart-of';
import { stories, zone, type StoryName } from '../features/holds/testing/told-stories';
import { layOutChart } from './test-chart-layout';
import { TestChart } from './test-chart';
import type { TestChartData } from './test-chart.types';

function chartOf(name: StoryName): TestChartData {
  const { test, terms } = stories[name];
  const analysis = analyseTest(test, terms);
  if (analysis === null) throw new Error('nothing to draw');
  return testChartOf({ test, analysis, terms });
}

function show(data: TestChartData): HTMLElement {
  render(
    <TestChart
      data={data}
      zone={zone}
      nowMs={data.points.at(-1)?.atMs ?? 0}
      number={(value) => String(Math.round(value))}
      unit="psi"
      degrees={String}
      degreesUnit="°F"
      name="Chart"
      expected={null}
    />,
  );
  return screen.getByRole('img', { name: 'Chart' });
}

const names = Object.keys(stories) as StoryName[];

describe('the chart of a test', () => {
  it.each(names)('never starts at 0 and always has the minimum in it: %s', (name) => {
    for (const width of [330, 600]) {
      const data = chartOf(name);
      const layout = layOutChart(data, width, zone);
      expect(layout.low).toBeGreaterThan(0);
      expect(layout.low).toBeLessThan(data.minimum ?? 0);
      expect(layout.high).toBeGreaterThan(data.minimum ?? 0);
      const printed = layout.timeTicks.filter(({ isLabelled }) => isLabelled).map(({ atMs }) => layout.x(atMs));
      printed.slice(1).forEach((x, index) => expect(x - (printed[index] ?? 0)).toBeGreaterThanOrEqual(57));
      layout.valueTicks.forEach((value) => expect(layout.y(value)).toBeLessThanOrEqual(layout.foot));
    }
  });

  it('prints no inches above the rim', () => {
    const data = chartOf('sound');
    const brimful = data.points.map((point) => ({ ...point, value: 0, isPast: false }));
    const level = { ...data, isLevel: true, minimum: null, cone: [], increment: 0.25, points: brimful };
    const { valueTicks } = layOutChart(level, 600, zone);
    expect(valueTicks.length).toBeGreaterThan(1);
    expect(Math.max(...valueTicks)).toBeLessThanOrEqual(0);
  });

  it('draws what was read with the valve shut as a square, and the jump', () => {
    const data = chartOf('gaugeLeaks');
    expect(data.jumps).toEqual([{ atMs: data.points[3]?.atMs, from: 108, to: 112.5 }]);
    const drawing = show(data);
    expect(drawing.querySelectorAll('rect[width="8"]')).toHaveLength(1);
    // four open readings, and where it will stand when the window opens
    expect(drawing.querySelectorAll('circle')).toHaveLength(5);
    const legend = within(screen.getByRole('list', { name: 'What the chart shows' }));
    expect(legend.getByText('valve shut')).toBeInTheDocument();
    expect(legend.queryByText('not counted')).not.toBeInTheDocument();
  });

  it('hatches the settling and draws its readings grey', () => {
    const data = chartOf('freshPex');
    expect(data.points.map(({ isUsed }) => isUsed)).toEqual([false, false, false, true, true, true]);
    // an hour from the first reading on
    expect((data.settling?.toMs ?? 0) - (data.settling?.fromMs ?? 0)).toBe(3_600_000);
    expect(show(data).textContent).toContain('pipe stretching: not counted');
  });

  it('shows of air what temperature explains: 60 psi at 61 °F is 57.2 at 41 °F and 12.228 psi of atmosphere', () => {
    const data = chartOf('coldNight');
    expect(data.bandIs).toBe('temperature');
    // (60 + 12.228) × 500.67 ÷ 520.67 − 12.228, P/T of the absolute values (calculations, section 1)
    const last = data.band.at(-1);
    expect(((last?.low ?? 0) + (last?.high ?? 0)) / 2).toBeCloseTo(57.226, 2);
    expect((last?.high ?? 0) - (last?.low ?? 0)).toBeCloseTo(1, 9);
  });

  it('opens the cone from the last used reading to the end of the window', () => {
    const data = chartOf('slowLeak');
    expect(data.cone.map(({ atMs }) => atMs)).toEqual([
      data.points.at(-1)?.atMs,
      data.window?.fromMs,
      data.window?.toMs,
    ]);
    const widths = data.cone.map(({ low, high }) => high - low);
    expect(widths[0]).toBeCloseTo(1, 9);
    expect(widths[1]).toBeGreaterThan(widths[0] ?? 0);
    expect(widths[2]).toBeGreaterThan(widths[1] ?? 0);
  });

  it('shows minimum and window alone before anything is read', () => {
    const bare: TestChartData = { ...chartOf('sound'), points: [], band: [], cone: [] };
    expect(show(bare).textContent).toContain('rule card minimum 100 psi');
  });
});
