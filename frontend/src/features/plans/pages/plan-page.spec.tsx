import { act, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { Me } from '@holdwater/shared-types/accounts/person.contract.js';
import type { System } from '@holdwater/shared-types/holds/hold.states.js';
import type { LotAbilities, LotDetail } from '@holdwater/shared-types/lots/lot.contract.js';
import type { TestPlan } from '@holdwater/shared-types/plans/plan.contract.js';
import { changeLanguage } from '../../../lib/i18n';
import { personOf, tallowmere } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi, type SentRequest } from '../../../lib/testing/stub-api';
import { holdOf, lotDetailOf, uuid } from '../../lots/testing/lot-fixtures';
import { measuredHouse, planOf, ruleCardId, ruleOf, waysOf } from '../testing/plan-fixtures';
import { PlanPage } from './plan-page';

interface Shown {
  system?: System;
  plans?: TestPlan[];
  abilities?: Partial<LotAbilities>;
  lot?: Partial<LotDetail>;
  me?: Partial<Me>;
  widthPx?: number;
  choose?: Parameters<typeof stubApi>[0][string];
  at?: string;
}

const path = `/api/lots/${uuid(17)}`;

function show({
  system = 'dwv',
  plans = [],
  abilities = { canTest: true },
  lot = {},
  me = {},
  widthPx,
  choose,
  at = '',
}: Shown = {}) {
  const units = [{ number: 1, label: 'House', geometry: measuredHouse }];
  const parties: LotDetail['parties'] = [
    {
      ...{ kind: 'plumber', status: 'attached' },
      organization: { id: uuid(820), name: 'Dunlatch Plumbing', kind: 'plumber', phone: '555-0110' },
      people: [{ id: uuid(821), name: 'Ruben Achterberg', phone: '555-0117' }],
    },
  ];
  const sent = stubApi({
    [`GET ${path}`]: () => ({ data: lotDetailOf(abilities, { units, parties, ...lot }) }),
    [`GET ${path}/plans`]: () => ({ data: { items: plans } }),
    [`GET ${path}/plans/history`]: () => ({
      data: { items: [planOf('attic-cut'), planOf('stack-to-roof', { id: uuid(811), isCurrent: false })] },
    }),
    [`GET ${path}/holds`]: () => ({ data: { items: [holdOf({ system: 'water' })] } }),
    [`POST ${path}/plan-offers`]: ({ body }) => ({
      data: {
        ...{ ruleCard: { id: ruleCardId, version: 6 }, isGroundwork: false, hasHouse: true },
        ways: waysOf(system, measuredHouse, (body as { tools: object }).tools),
      },
    }),
    [`POST ${path}/plans`]: choose ?? (() => ({ status: 201, data: planOf('stack-to-roof') })),
    [`GET /api/rule-cards/${ruleCardId}`]: () => ({ data: ruleCard() }),
  });
  renderPage(
    <Routes>
      <Route path="/lots/:lotId/plan" element={<PlanPage />} />
    </Routes>,
    { me: personOf(me), at: `/lots/${uuid(17)}/plan${at || `?system=${system}`}`, widthPx },
  );
  return sent;
}

const ruleCard = () => ({
  ...{ id: ruleCardId, departmentId: tallowmere.id, version: 6, state: 'published', isInForce: true },
  ...{ effectiveFrom: '2026-01-02', effectiveTo: null, departmentName: tallowmere.name, zone: 'America/Denver' },
  content: { tests: [ruleOf('dwv'), ruleOf('water')], stages: [] },
  publishedAt: '2026-01-01T16:00:00Z',
});

const ways = async () => within(await screen.findByRole('list', { name: 'Ways to test it here' }));
const chosenBody = (sent: readonly SentRequest[]) =>
  sent.find((each) => each.method === 'POST' && each.path.endsWith('/plans'))?.body;

beforeEach(() => {
  window.localStorage.clear();
  // answers of the stub are what is tested here, not the rule card's contract
  vi.stubEnv('DEV', false);
});

describe('the plan page', () => {
  it('shows every way side by side and says of each that does not serve why', async () => {
    show();
    const buttons = (await ways()).getAllByRole('button');
    expect(buttons).toHaveLength(7);
    expect(buttons[1]).toHaveTextContent('Attic cut24.0 ft, about 10.4 psi at the plug');
    expect(buttons[3]).toHaveTextContent('the rule card does not accept it');
    expect(buttons[6]).toHaveTextContent('no air in plastic pipe: PVC');
    expect(within(buttons[6] as HTMLElement).getByRole('img', { name: 'Does not serve here' })).toBeInTheDocument();
  });

  it('has head and pressure by floor in the drawing’s twin', async () => {
    show({ plans: [planOf('attic-cut')] });
    const twin = await screen.findByRole('table', { name: 'Head and pressure by floor' });
    const rows = within(twin).getAllByRole('row').slice(1);
    const cells = rows.map((row) => [...row.children].map((cell) => cell.textContent ?? ''));
    // heads of the mockup of the lot sheet; engineeringtoolbox head table: 0.4335 psi a foot (check-values.md, section 2)
    expect(cells.map(([place, , head]) => [place, head])).toEqual([
      ['Attic floor', '2.0'],
      ['Second floor', '11.0'],
      ['First floor', '21.0'],
      ['Test plug', '24.0'],
    ]);
    for (const [, , head, pressure] of cells) expect(Number(pressure)).toBeCloseTo(Number(head) * 0.4335, 1);
  });

  it('tells level, water, weight and time, steps, take-down by group, and who decides', async () => {
    show({ plans: [planOf('attic-cut')] });
    expect(await screen.findByText('Chosen: Attic cut')).toBeInTheDocument();
    const numbers = await screen.findByText('Water needed');
    // ASTM D2665: 3 in schedule 40 holds 0.38403 gal/ft; 24 of 27.5 ft of height, so 78.5 of 90 ft of pipe, stand under water
    expect(numbers.parentElement).toHaveTextContent('about 30 gal');
    expect(screen.getByText('It weighs').parentElement).toHaveTextContent('about 250 lb');
    expect(screen.getByText('Time to fill').parentElement).toHaveTextContent('fill rate not told');
    expect(screen.getByText('until seen')).toBeInTheDocument();
    const steps = within(screen.getByRole('region', { name: 'Putting it up' })).getAllByRole('listitem');
    expect(steps.map((step) => step.textContent)).toContain(
      'Fill slowly to 24.0 ft above the plug and let the air come out.',
    );
    const left = screen.getByRole('region', { name: 'What it leaves to put back' });
    const groups = within(left)
      .getAllByRole('heading', { level: 3 })
      .map((each) => each.textContent);
    expect(groups).toEqual(['Before plumbing is clear', 'Before fixtures', 'Before use']);
    expect(within(left).getByText('Rejoin and glue the vent cut, photo in the attic')).toBeInTheDocument();
    expect(screen.getByText('The local code, the department and a licensed plumber decide.')).toBeInTheDocument();
  });

  it('puts each caution beside what it concerns', async () => {
    show({ plans: [planOf('laundry-box')] });
    expect(await screen.findByText(/Never stand or reach in line with a plug/)).toBeInTheDocument();
    expect(screen.getByText(/gal go where/)).toBeInTheDocument();
  });

  it('chooses a way with the tools typed, and keeps them for the next lot', async () => {
    const sent = show();
    const user = userEvent.setup();
    await user.click((await ways()).getByRole('button', { name: /Stack to roof/ }));
    await user.type(screen.getByLabelText(/Hose fills/), '5');
    await user.click(await screen.findByRole('button', { name: 'Choose this way' }));
    await waitFor(() => expect(chosenBody(sent)).toBeDefined());
    expect(chosenBody(sent)).toMatchObject({
      ...{ unitNumber: 1, stageCode: 'rough-in', system: 'dwv', method: 'stack-to-roof', medium: 'water' },
      tools: { fillRateGpm: 5, gauge: { rangePsi: 200, incrementPsi: 1 } },
    });
    await waitFor(() => expect(window.localStorage.getItem('holdwater.plan-tools')).toContain('"fillRateGpm":5'));
  });

  it('works the time to fill out anew as the hose is typed', async () => {
    show();
    await userEvent.type(await screen.findByLabelText(/Hose fills/), '5');
    await waitFor(() => expect(screen.getByText('Time to fill').parentElement).toHaveTextContent('about 7 min'));
  });

  it('says in the act why a way cannot be chosen, and does not choose it', async () => {
    const sent = show();
    await userEvent.click((await ways()).getByRole('button', { name: /Air/ }));
    const act = await screen.findByRole('button', { name: /Choose this way.*the rule card does not accept it/ });
    await userEvent.click(act);
    expect(chosenBody(sent)).toBeUndefined();
  });

  it('tells a refusal in words and keeps what was chosen', async () => {
    show({ choose: () => refusal('plan-not-usable') });
    await userEvent.click(await screen.findByRole('button', { name: 'Choose this way' }));
    expect(await screen.findByText('This way does not serve here')).toBeInTheDocument();
  });

  it('marks what is wrong with a tool on its field', async () => {
    show({ system: 'water' });
    const mark = await screen.findByLabelText('One mark is');
    await userEvent.clear(mark);
    await userEvent.type(mark, '0');
    expect(await screen.findByText(/above zero|more than zero|positive/i)).toBeInTheDocument();
    expect(mark).toHaveAttribute('aria-invalid', 'true');
  });

  it('says when the house or the rule card changed, and works it out anew', async () => {
    const sent = show({ plans: [planOf('attic-cut', { stale: ['geometry-changed', 'rule-card-changed'] })] });
    const told = await screen.findByText(/The house was measured anew/);
    expect(told).toHaveTextContent('Another rule card is in force');
    await userEvent.click(screen.getByRole('button', { name: 'Work it out anew' }));
    await waitFor(() => expect(chosenBody(sent)).toMatchObject({ method: 'attic-cut', medium: 'water' }));
  });

  it('lets the other parties read and print, and choose nothing', async () => {
    show({ abilities: {}, plans: [planOf('attic-cut')] });
    expect(await screen.findByText('The plumber of the lot chooses.')).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Choose/ })).not.toBeInTheDocument();
    expect(screen.queryByLabelText(/Hose fills/)).not.toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Print the plan and the tag' })).toBeInTheDocument();
  });

  it('keeps the plans before, and reads them when they are asked for', async () => {
    const sent = show({ plans: [planOf('attic-cut')] });
    const summary = await screen.findByText('Plans before');
    expect(sent.some(({ path: asked }) => asked.endsWith('/history'))).toBe(false);
    await userEvent.click(summary);
    expect(await screen.findByText('Stack to roof, Ruben Achterberg')).toBeInTheDocument();
  });

  it('leads to the house where nobody measured it, and only those who may', async () => {
    const units = [{ number: 1, label: 'House', geometry: null }];
    show({ lot: { units }, abilities: { canEditGeometry: true } });
    expect(await screen.findByText('The house is not measured yet')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'Fill in the house' })).toHaveAttribute(
      'href',
      `/lots/${uuid(17)}/edit?part=house&unit=1`,
    );
  });

  it('has nothing to plan without a rule card, nor at a stage without a test', async () => {
    show({ lot: { stages: [] } });
    expect(await screen.findByText('Nothing to plan yet')).toBeInTheDocument();
  });
});

describe('the plan of water lines', () => {
  it('shows target, limit and minimum on the gauge in hand, and the pressure on every floor', async () => {
    show({ system: 'water', plans: [planOf('gauge')] });
    // rated 126 less the head of 5 ft: NIST SP 811, 0.4335 psi a foot, down to a whole mark
    expect(await screen.findByRole('img', { name: /minimum 100 psi; limit 123; pump to 120/ })).toBeInTheDocument();
    const table = screen.getByRole('table', { name: /Pressure by floor at 120 psi/ });
    const rows = within(table).getAllByRole('row').slice(1);
    expect(rows.map((row) => row.textContent)).toEqual([
      'Second floor117 psi',
      'First floor122 psi',
      'Highest outlet114 psi',
      'Lowest fitting122 psi',
    ]);
    expect(screen.getByText('not enough: pump')).toBeInTheDocument();
    expect(screen.getByText(/Shut the meter valve before pumping/)).toBeInTheDocument();
  });

  it('is in metres and kilopascals by choice, the gauge staying a gauge', async () => {
    show({ plans: [planOf('attic-cut')], me: { units: 'metric' } });
    const fill = await screen.findByText('Fill to');
    // 24 ft are 7.3 m, 30.2 gal are 114 L to the next five (NIST SP 811)
    expect(fill.parentElement).toHaveTextContent('7.3 m above the plug');
    expect(screen.getByText('Water needed').parentElement).toHaveTextContent('about 115 L');
  });
});

describe('on a phone and in Spanish', () => {
  it('has one head with the way back to the lot', async () => {
    show({ widthPx: 390, plans: [planOf('attic-cut')] });
    expect(await screen.findByRole('link', { name: /Back/ })).toHaveAttribute('href', `/lots/${uuid(17)}`);
    expect(screen.getAllByRole('heading', { level: 1 })).toHaveLength(1);
  });

  it('says all of it in Spanish', async () => {
    await act(() => changeLanguage('es'));
    try {
      show({ plans: [planOf('attic-cut')], me: { locale: 'es' } });
      expect(await screen.findByText(/^Elegido: /)).toBeInTheDocument();
      expect(await screen.findByText(/Nunca se ponga ni meta la mano en línea con un tapón/)).toBeInTheDocument();
      expect(screen.getByText('Unir y pegar el corte de la ventilación, foto en el ático')).toBeInTheDocument();
      expect(screen.queryByText(/^(plans|ways|section|cautions|steps|takeDown)\./)).not.toBeInTheDocument();
    } finally {
      await act(() => changeLanguage('en'));
    }
  });
});

describe('on paper', () => {
  it('is one sheet with plan and gauge tag, whom to call, and a code that leads to the lot', async () => {
    const print = vi.spyOn(window, 'print').mockImplementation(() => undefined);
    show({ system: 'water', plans: [planOf('gauge')] });
    await userEvent.click(await screen.findByRole('button', { name: 'Print the plan and the tag' }));
    expect(print).toHaveBeenCalledOnce();
    const tag = within(screen.getByRole('region', { name: 'Gauge tag' }));
    expect(tag.getByText('Under pressure.')).toBeInTheDocument();
    expect(tag.getByText('No cortar, clavar ni aflojar.')).toBeInTheDocument();
    expect(tag.getByText('Call Ruben Achterberg. Llame al')).toBeInTheDocument();
    expect(tag.getByText('555-0117')).toBeInTheDocument();
    expect(tag.getByText('water in PEX')).toBeInTheDocument();
    expect(tag.getByRole('img', { name: 'QR code of this lot' })).toBeInTheDocument();
    act(() => void window.dispatchEvent(new Event('afterprint')));
    expect(screen.queryByRole('region', { name: 'Gauge tag' })).not.toBeInTheDocument();
  });
});
