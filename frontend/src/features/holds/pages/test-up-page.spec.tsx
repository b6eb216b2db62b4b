import { houseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import { cleanup, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { personOf } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi, type SentRequest } from '../../../lib/testing/stub-api';
import {
  answersFor,
  dwvHold,
  holdId,
  holdOf,
  house,
  lotId,
  lotOf,
  noAbilities,
  plumberAbilities,
  readingOf,
  visitId,
  visitOf,
} from '../testing/tested-lot';
import { TestUpPage } from './test-up-page';

const me = personOf({}, ['plumber']);

function show(at = `/lots/${lotId}/test?system=water`): void {
  const page = (
    <Routes>
      <Route path="/lots/:lotId/test" element={<TestUpPage />} />
    </Routes>
  );
  renderPage(page, { me, at });
}

const writes = (sent: readonly SentRequest[]): SentRequest[] => sent.filter(({ method }) => method === 'POST');

describe('a reading of a test that stands', () => {
  it('goes with "test up" in one act, once the valve is told', async () => {
    const up = visitOf({ state: 'ready', version: 4, moves: ['no-longer-up'] });
    const sent = stubApi({
      ...answersFor({ holds: [dwvHold, holdOf()] }),
      [`POST /api/visits/${visitId}/test-up`]: () => ({ data: up }),
    });
    show();
    await userEvent.type(await screen.findByLabelText('Gauge reads'), '58.5');
    expect(screen.getByRole('button', { name: /Save and say test up.*valve open or shut/ })).toHaveAttribute(
      'aria-disabled',
      'true',
    );
    await userEvent.click(screen.getByRole('radio', { name: 'open' }));
    await userEvent.click(screen.getByRole('button', { name: 'Save and say test up' }));
    await waitFor(() => expect(writes(sent)).toHaveLength(1));
    expect(writes(sent)[0]?.body).toMatchObject({
      expectedVersion: 3,
      readings: [{ holdId, pressurePsi: 58.5, gaugeValve: 'open' }],
    });
  });

  it('with the valve shut tells of the gauge only and says nothing up; it can be saved', async () => {
    const sent = stubApi({
      ...answersFor({ holds: [dwvHold, holdOf()] }),
      [`POST /api/holds/${holdId}/readings`]: () => ({ data: holdOf() }),
    });
    show();
    await userEvent.type(await screen.findByLabelText('Gauge reads'), '57');
    await userEvent.click(screen.getByRole('radio', { name: 'shut' }));
    expect(screen.getByText(/This tells of the gauge only/)).toBeInTheDocument();
    expect(screen.getByRole('button', { name: /Save and say test up.*valve shut/ })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Save reading only' }));
    await waitFor(() => expect(writes(sent)[0]?.body).toMatchObject({ pressurePsi: 57, gaugeValve: 'shut' }));
  });

  it('over the lowest-rated part shows the red headline alone', async () => {
    stubApi(answersFor({ holds: [dwvHold, holdOf()] }));
    show();
    await userEvent.type(await screen.findByLabelText('Gauge reads'), '81');
    expect(screen.getByRole('alert')).toHaveTextContent('let it down to 80 psi now');
    expect(screen.queryByText(/Compressed air/)).not.toBeInTheDocument();
    expect(screen.getByRole('button', { name: /Save and say test up.*over the limit/ })).toBeInTheDocument();
  });

  it('beyond the gauge offers what was likely meant', async () => {
    stubApi(answersFor({ holds: [dwvHold, holdOf()] }));
    show();
    await userEvent.type(await screen.findByLabelText('Gauge reads'), '570');
    await userEvent.click(screen.getByRole('button', { name: 'Did you mean 57? Use it' }));
    expect(screen.getByLabelText('Gauge reads')).toHaveValue('57');
  });

  it('is not "up" below the minimum, nor while another system is not', async () => {
    stubApi(answersFor({ holds: [holdOf({ readings: [readingOf({ pressurePsi: 49.5 })] })] }));
    show();
    expect(await screen.findByRole('button', { name: /Say test up.*below 50 psi/ })).toBeInTheDocument();
    await userEvent.type(screen.getByLabelText('Gauge reads'), '52');
    await userEvent.click(screen.getByRole('radio', { name: 'open' }));
    expect(screen.getByRole('button', { name: /Save and say test up.*DWV not up/ })).toBeInTheDocument();
  });

  it('steps half a mark of the gauge', async () => {
    stubApi(answersFor({ holds: [dwvHold, holdOf()] }));
    show();
    await userEvent.click(await screen.findByRole('button', { name: 'Half a mark more' }));
    expect(screen.getByLabelText('Gauge reads')).toHaveValue('57');
    await userEvent.click(screen.getByRole('button', { name: 'Half a mark more' }));
    expect(screen.getByLabelText('Gauge reads')).toHaveValue('57.5');
  });

  it('keeps what was typed when it is refused', async () => {
    stubApi({
      ...answersFor({ holds: [dwvHold, holdOf()] }),
      [`POST /api/holds/${holdId}/readings`]: () => refusal('hold-ended'),
    });
    show();
    await userEvent.type(await screen.findByLabelText('Gauge reads'), '57');
    await userEvent.click(screen.getByRole('radio', { name: 'open' }));
    await userEvent.click(screen.getByRole('button', { name: 'Save reading only' }));
    expect(await screen.findByRole('alert')).toBeInTheDocument();
    expect(screen.getByLabelText('Gauge reads')).toHaveValue('57');
  });
});

describe('a test that is started', () => {
  it('takes a way the rule card accepts, the gauge and the first reading in one act', async () => {
    const sent = stubApi({ ...answersFor(), [`POST /api/lots/${lotId}/holds`]: () => ({ data: holdOf() }) });
    show();
    await userEvent.click(await screen.findByRole('radio', { name: 'air, at least 50 psi' }));
    expect(screen.getByLabelText(/Lowest-rated part/)).toHaveValue('80');
    await userEvent.type(screen.getByLabelText('Gauge reads'), '55');
    await userEvent.click(screen.getByRole('radio', { name: 'open' }));
    await userEvent.click(screen.getByRole('button', { name: 'Start the test only' }));
    expect(writes(sent)).toEqual([]);
    expect(screen.getAllByText('This is needed.')).toHaveLength(2);
    await userEvent.type(screen.getByLabelText('Gauge goes to'), '100');
    await userEvent.type(screen.getByLabelText('Smallest mark'), '1');
    await userEvent.click(screen.getByRole('button', { name: 'Start the test only' }));
    await waitFor(() =>
      expect(writes(sent)[0]?.body).toMatchObject({
        unitNumber: 1,
        stageCode: 'rough-in',
        system: 'water',
        method: 'gauge',
        medium: 'air',
        gauge: { rangePsi: 100, incrementPsi: 1 },
        ceilingPsi: 80,
        firstReading: { pressurePsi: 55, gaugeValve: 'open' },
      }),
    );
  });

  it('of the drains takes its level from the house', async () => {
    const sent = stubApi({
      ...answersFor({ holds: [] }),
      [`POST /api/lots/${lotId}/holds`]: () => ({ data: dwvHold }),
    });
    show(`/lots/${lotId}/test?system=dwv`);
    await userEvent.click(await screen.findByRole('radio', { name: 'filled to a cut in the attic' }));
    expect(screen.getByLabelText('Water stands at')).toHaveValue('21');
    // the plug lies 3 ft under the first floor
    expect(document.body).toHaveTextContent('24.0 ft above the plug');
    await userEvent.type(screen.getByLabelText('Smallest mark of the tape'), '0.25');
    await userEvent.type(screen.getByLabelText('Water below the rim'), '1.5');
    await userEvent.click(screen.getByRole('button', { name: 'Start the test only' }));
    await waitFor(() =>
      expect(writes(sent)[0]?.body).toMatchObject({
        method: 'attic-cut',
        medium: 'water',
        tape: { incrementIn: 0.25 },
        fillLevelFt: 21,
        firstReading: { levelIn: 1.5 },
      }),
    );
  });
});

describe('a reading that was wrong', () => {
  it('is struck with its reason after one question, and stays in the list struck', async () => {
    const wrong = readingOf();
    const shown = { holds: [dwvHold, holdOf({ readings: [wrong] })] };
    const struck = holdOf({ readings: [{ ...wrong, isStruck: true, struckWhy: 'read the wrong gauge' }] });
    const answers = answersFor(shown);
    const sent = stubApi({
      ...answers,
      [`GET /api/lots/${lotId}/holds`]: () => ({ data: { items: shown.holds } }),
      [`POST /api/readings/${wrong.id}/strike`]: () => {
        shown.holds = [dwvHold, struck];
        return { data: struck };
      },
    });
    show();
    await userEvent.click(await screen.findByRole('button', { name: 'Strike 57 psi of Tue, Apr 14, 5:08 pm' }));
    const dialog = screen.getByRole('dialog');
    expect(dialog).toHaveTextContent('It stays in the log, struck');
    await userEvent.type(within(dialog).getByLabelText('Why it is struck'), ' read the wrong gauge ');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Strike the reading' }));
    await waitFor(() => expect(writes(sent)[0]?.body).toEqual({ why: 'read the wrong gauge' }));
    expect(await screen.findByText(/struck: read the wrong gauge/)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /^Strike 57/ })).not.toBeInTheDocument();
  });

  it('keeps what was typed when it could not be struck, and says why', async () => {
    const wrong = readingOf();
    stubApi({
      ...answersFor({ holds: [dwvHold, holdOf({ readings: [wrong] })] }),
      [`POST /api/readings/${wrong.id}/strike`]: () => refusal('not-allowed'),
    });
    show();
    await userEvent.click(await screen.findByRole('button', { name: /^Strike 57/ }));
    const dialog = screen.getByRole('dialog');
    await userEvent.type(within(dialog).getByLabelText('Why it is struck'), 'misread');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Strike the reading' }));
    expect(await within(dialog).findByRole('alert')).not.toBeEmptyDOMElement();
    expect(within(dialog).getByLabelText('Why it is struck')).toHaveValue('misread');
  });
});

describe('what the reader may do', () => {
  it('a helper reads, and is not offered "test up"', async () => {
    const lot = lotOf({ abilities: { ...noAbilities, canAddReading: true } });
    stubApi(answersFor({ lot, holds: [dwvHold, holdOf()] }));
    show();
    expect(await screen.findByRole('button', { name: /Save reading/ })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /test up/i })).not.toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /End/ })).not.toBeInTheDocument();
  });

  it('a helper is told who starts a test that is not there', async () => {
    stubApi(answersFor({ lot: lotOf({ abilities: { ...noAbilities, canAddReading: true } }) }));
    show();
    expect(await screen.findByRole('heading', { name: /Water, test 1 is not started/ })).toBeInTheDocument();
    expect(screen.queryByLabelText('Gauge reads')).not.toBeInTheDocument();
  });

  it('what is up is taken back after a question that says who is told', async () => {
    const ready = visitOf({ state: 'ready', version: 4, upSince: '2026-04-14T23:08:00Z', moves: ['no-longer-up'] });
    const sent = stubApi({
      ...answersFor({ visits: [ready], holds: [dwvHold, holdOf()], lot: lotOf({ abilities: plumberAbilities }) }),
      [`POST /api/visits/${visitId}/no-longer-up`]: () => ({ data: visitOf({ version: 5 }) }),
    });
    show();
    await userEvent.click(await screen.findByRole('button', { name: 'No longer up' }));
    const dialog = screen.getByRole('dialog');
    expect(dialog).toHaveTextContent('Odderly Homes and Noor Haverty are told at once');
    await userEvent.click(within(dialog).getByRole('button', { name: 'No longer up' }));
    await waitFor(() => expect(writes(sent)[0]?.body).toMatchObject({ expectedVersion: 4 }));
  });

  it('a test ends with its reason', async () => {
    const sent = stubApi({
      ...answersFor({ holds: [dwvHold, holdOf()] }),
      [`POST /api/holds/${holdId}/end`]: () => ({ data: holdOf({ state: 'ended' }) }),
    });
    show();
    await userEvent.click(await screen.findByRole('button', { name: 'End Water, test 1' }));
    const dialog = screen.getByRole('dialog');
    await userEvent.click(within(dialog).getByRole('radio', { name: /did not hold/ }));
    await userEvent.click(within(dialog).getByRole('button', { name: 'End the test' }));
    await waitFor(() => expect(writes(sent)[0]?.body).toMatchObject({ reason: 'lost' }));
  });
});

describe('the answer to a reading, on the device', () => {
  /** Tue, Apr 14, 2026, 5:10 pm in Denver (UTC−6, IANA tz). */
  beforeEach(() => {
    vi.useFakeTimers({ now: new Date('2026-04-14T23:10:00Z'), toFake: ['Date'] });
    window.localStorage.clear();
  });
  afterEach(() => vi.useRealTimers());

  const copper = houseGeometry.parse({ ...house, waterPipeMaterials: ['copper'], elevationFt: 5000 });
  const lot = lotOf({ units: [{ number: 1, label: 'House', geometry: copper }] });
  const bare = holdOf({ readings: [] });

  async function typeReading(psi: string): Promise<void> {
    await userEvent.type(await screen.findByLabelText(/Air in the house now/), '61');
    await userEvent.type(screen.getByLabelText(/Air at the window/), '47');
    await userEvent.type(screen.getByLabelText(/Coldest tonight/), '33');
    await userEvent.type(screen.getByLabelText('Gauge reads'), psi);
    await userEvent.click(screen.getByRole('radio', { name: 'open' }));
  }

  it('tells what the needle will show at the window and what to pump to, and asks nothing of the server', async () => {
    const sent = stubApi(answersFor({ lot, holds: [dwvHold, bare] }));
    show();
    await typeReading('51');
    // 51 psi at 61 °F, 12.228 psia: (63.228 × 506.67 ÷ 520.67) − 12.228 = 49.3 psi at 47 °F (P/T of the absolute values)
    const answer = screen.getByRole('status');
    expect(answer).toHaveTextContent('About 49 psi (48–51) at Wed, Apr 15, 9:00 am, 47 °F.');
    expect(answer).toHaveTextContent('Pump to 53 psi to be safe.');
    expect(answer).toHaveTextContent('One reading: read again after 8:45 pm to know the trend.');
    expect(screen.getByRole('img', { name: /^Gauge, 51 psi.*about 49 at the window; pump to 53/ })).toBeInTheDocument();
    expect(
      screen.getByRole('img', { name: 'At 9:00 am about 49 psi (48–51), minimum 50, pump to 53' }),
    ).toBeInTheDocument();
    expect(screen.getByText(/33 °F tonight is close to freezing/)).toBeInTheDocument();
    expect(writes(sent)).toEqual([]);
  });

  it('short at the window asks one question before it is said to be up', async () => {
    const up = visitOf({ state: 'ready', version: 4, moves: ['no-longer-up'] });
    const sent = stubApi({
      ...answersFor({ lot, holds: [dwvHold, bare] }),
      [`POST /api/visits/${visitId}/test-up`]: () => ({ data: up }),
    });
    show();
    await typeReading('51');
    await userEvent.click(screen.getByRole('button', { name: 'Save and say test up' }));
    const dialog = screen.getByRole('dialog');
    expect(dialog).toHaveTextContent('Pump to 53 psi to be safe.');
    expect(writes(sent)).toEqual([]);
    await userEvent.click(within(dialog).getByRole('button', { name: 'Say test up' }));
    await waitFor(() =>
      expect(writes(sent)[0]?.body).toMatchObject({ readings: [{ holdId, pressurePsi: 51, temperatureF: 61 }] }),
    );
  });

  it('remembers the temperatures for the next lot of the tract', async () => {
    stubApi(answersFor({ lot, holds: [dwvHold, bare] }));
    show();
    await typeReading('53');
    cleanup();
    show();
    expect(await screen.findByLabelText(/Air at the window/)).toHaveValue('47');
    expect(screen.getByLabelText(/Air in the house now/)).toHaveValue('61');
  });

  it('gives an inspector the answer only to an own reading', async () => {
    const inspected = lotOf({ units: lot.units, abilities: { ...noAbilities, canAddReading: true, canDecide: true } });
    stubApi(answersFor({ lot: inspected, holds: [dwvHold, holdOf()] }));
    show();
    await screen.findByLabelText('Gauge reads');
    expect(screen.queryByRole('status')).not.toBeInTheDocument();
    await userEvent.type(screen.getByLabelText('Gauge reads'), '57');
    await userEvent.click(screen.getByRole('radio', { name: 'open' }));
    expect(screen.getByRole('status')).toHaveTextContent('9:00 am');
  });
});
