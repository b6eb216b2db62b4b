import { screen, waitFor, within } from '@testing-library/react';
import { Route, Routes } from 'react-router-dom';
import type { Hold } from '@holdwater/shared-types/holds/hold.contract.js';
import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { LotAbilities } from '@holdwater/shared-types/lots/lot.contract.js';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { stubApi } from '../../../lib/testing/stub-api';
import { keepTemperatures, noTemperatures } from '../../holds/kept-temperatures';
import { atHour, stories, type StoryName } from '../../holds/testing/told-stories';
import { holdOf, house, lotDetailOf, readingOf, uuid, visitOf } from '../testing/lot-fixtures';
import { LotSheetPage } from './lot-sheet-page';

/** The morning of the window in the stories. */
beforeEach(() => {
  vi.useFakeTimers({ now: new Date(atHour(31.4)), toFake: ['Date'] });
  window.localStorage.clear();
  keepTemperatures(uuid(900), 'America/Denver', { ...noTemperatures, window: '47' }, new Date(atHour(17)));
});
afterEach(() => vi.useRealTimers());

const copperHouse = houseGeometry.parse({ ...house, waterPipeMaterials: ['copper'], elevationFt: 5000 });
const plasticHouse = houseGeometry.parse({ ...house, waterPipeMaterials: ['pex'], elevationFt: 5000 });

function holdOfStory(name: StoryName): Hold {
  const { test } = stories[name];
  const { gauge, minimumPsi, ceilingPsi, settleMinutes, medium } = test;
  const readings = test.readings.map(({ at, pressurePsi, temperatureF, gaugeValve }, index) =>
    readingOf(at, { id: uuid(400 + index), pressurePsi, temperatureF, gaugeValve }),
  );
  return holdOf({ gauge, minimumPsi, ceilingPsi, settleMinutes, medium, readings, startedAt: readings[0]?.at });
}

function show(hold: Hold, isPlastic = false, abilities: Partial<LotAbilities> = {}, widthPx?: number): void {
  const path = `/api/lots/${uuid(17)}`;
  const window = { date: '2026-04-15', label: 'morning', startAt: atHour(33), endAt: atHour(35) };
  const geometry = isPlastic ? plasticHouse : copperHouse;
  stubApi({
    [`GET ${path}`]: () => ({
      data: lotDetailOf(abilities, { units: [{ number: 1, label: 'House', geometry }] }),
    }),
    [`GET ${path}/holds`]: () => ({ data: { items: [hold] } }),
    [`GET ${path}/visits`]: () => ({ data: { items: [visitOf({ window })] } }),
    'GET /api/corrections': () => ({ data: { items: [], nextCursor: null } }),
    [`GET ${path}/ledger`]: () => ({ data: { items: [], nextCursor: null, total: 0 } }),
    [`GET ${path}/ledger/check`]: () => ({ data: { isWhole: true, entries: 41, firstBroken: null } }),
    [`GET ${path}/comments`]: () => ({ data: { items: [], nextCursor: null } }),
  });
  renderPage(
    <Routes>
      <Route path="/lots/:lotId" element={<LotSheetPage />} />
    </Routes>,
    { me: personOf(), at: `/lots/${uuid(17)}?system=water`, widthPx },
  );
}

const panel = async (): Promise<HTMLElement> => screen.findByRole('region', { name: /^Water, test 1/ });
const verdictSays = async (words: RegExp): Promise<void> => {
  const shown = within(await panel());
  await waitFor(() => expect(shown.getByRole('status')).toHaveTextContent(words));
};

// The stories are of the trade (common practice, no published source).
describe('the eight told stories on the lot sheet', () => {
  const said: Record<StoryName, RegExp> = {
    sound: /About 119 psi \(118–121\) at 9:00 am, 47 °F\.It holds\./,
    slowLeak: /Losing about 1 psi an hour: look for a leak\./,
    coldNight: /Temperature explains the fall\. It holds\./,
    freshPex: /It holds\..*Down 1 psi since Tue, Apr 14, 6:04 pm\./,
    gaugeLeaks: /It holds\..*jumped from 108 to 112\.5 psi.*the gauge leaks, not the house\./,
    houseLeaks: /look for a leak\..*the house, not the gauge\./,
    toppedUpTwice: /It holds\./,
    oneReading: /About 49 psi \(48–51\) at 9:00 am, 47 °F\.Pump to 53 psi to be safe\./,
  };
  it.each(Object.entries(said))('%s', async (name, words) => {
    const story = name as StoryName;
    show(holdOfStory(story), story === 'freshPex');
    await verdictSays(words);
    expect(screen.getByRole('img', { name: /^Chart of \d+ reading/ })).toBeInTheDocument();
  });

  it.each(['sound', 'coldNight', 'freshPex', 'toppedUpTwice', 'oneReading'] as const)(
    'does not call %s a leak anywhere on the page',
    async (story) => {
      show(holdOfStory(story), story === 'freshPex');
      await verdictSays(/at 9:00 am/);
      // the caution on topping up speaks of what topping hides, not of this house (definitions: many-top-ups)
      const said = document.body.textContent?.replace('repeated topping hides a leak', '');
      expect(said).not.toMatch(/leak/i);
    },
  );
});

describe('the log of readings', () => {
  it('says of water what fell since it settled, and shut and opened readings to the second', async () => {
    show(holdOfStory('gaugeLeaks'));
    const log = within(await panel());
    expect(await log.findByRole('columnheader', { name: 'Since settled' })).toBeInTheDocument();
    const opened = log.getByText(/^opened: jumped/).closest('tr');
    expect(opened).toHaveTextContent('opened: jumped 4.5');
    expect(opened).toHaveTextContent('6:45:40 am');
    expect(opened).toHaveTextContent('−0.5');
    expect(log.getByRole('cell', { name: 'gauge only' })).toBeInTheDocument();
    expect(log.getByRole('cell', { name: '0, counted from here' })).toBeInTheDocument();
  });

  it('says of air what temperature says and what it leaves over', async () => {
    show(holdOfStory('coldNight'));
    const log = within(await panel());
    expect(await log.findByRole('columnheader', { name: 'Temperature says' })).toBeInTheDocument();
    // 60 psi at 61 °F: 57.2 at 41 °F, P/T of the absolute values
    const [newest] = log.getAllByRole('row').filter((row) => row.textContent?.includes('7:00 am'));
    const cells = within(newest ?? document.body).getAllByRole('cell');
    expect(cells.map((cell) => cell.textContent).slice(4, 6)).toEqual(['57', '0']);
  });

  it('has no columns of its own on a phone, but says the same in a line', async () => {
    show(holdOfStory('coldNight'), false, {}, 390);
    const log = within(await panel());
    await waitFor(() => expect(log.getByRole('table')).toHaveTextContent('temperature says 57, left over 0'));
    expect(log.queryByRole('columnheader', { name: 'Left over' })).not.toBeInTheDocument();
  });

  it('keeps what it says from an inspector until the own reading is typed', async () => {
    show(holdOfStory('sound'), false, { canDecide: true });
    const log = within(await panel());
    expect(await log.findByText(/shows once you have typed your own reading/)).toBeInTheDocument();
    expect(log.queryByRole('status')).not.toBeInTheDocument();
    expect(screen.getByRole('img', { name: /^Chart of 3 readings/ })).not.toHaveAccessibleName(/expected/);
  });

  it('no longer judges a test that ended', async () => {
    show({ ...holdOfStory('slowLeak'), state: 'ended', endedAt: atHour(31.2), endReason: 'lost' });
    const log = within(await panel());
    expect(await log.findByRole('img', { name: /^Chart of 4 readings/ })).toBeInTheDocument();
    expect(log.queryByRole('status')).not.toBeInTheDocument();
  });
});
