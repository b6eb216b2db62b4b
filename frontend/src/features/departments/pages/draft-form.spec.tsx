import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { personOf, tallowmere } from '../../../lib/testing/people';
import { renderPage } from '../../../lib/testing/render-page';
import { refusal, stubApi } from '../../../lib/testing/stub-api';
import { briefOf, cardOf, content, department } from '../testing/rule-card-fixtures';
import { RuleCardPage } from './rule-card-page';

const desk = personOf({ memberships: [{ organization: tallowmere, roles: ['desk'] }] }, ['desk']);
const draft = briefOf(7, 'draft');
const touches = {
  keptVisits: { booked: 0, requested: 0, versions: [] },
  lotsWithoutVisit: 0,
  told: [],
  unfitPlans: [],
};

function open(said: RuleCardContent = content, more: Parameters<typeof stubApi>[0] = {}) {
  const inForce = briefOf(6, 'published');
  const sent = stubApi({
    'GET /api/departments': () => ({ data: { items: [department] } }),
    [`GET /api/departments/${tallowmere.id}`]: () => ({
      data: {
        ...{ department, ruleCards: [draft, inForce], closures: [] },
        abilities: { canEditRuleCards: true, canClose: true },
      },
    }),
    [`GET /api/rule-cards/${inForce.id}`]: () => ({ data: cardOf(6, 'published') }),
    [`GET /api/rule-cards/${draft.id}`]: () => ({ data: cardOf(7, 'draft', said) }),
    [`GET /api/rule-cards/${draft.id}/touches`]: () => ({ data: touches }),
    [`PUT /api/rule-cards/${draft.id}`]: ({ body }) => ({
      data: cardOf(7, 'draft', (body as { content: RuleCardContent }).content),
    }),
    ...more,
  });
  renderPage(
    <Routes>
      <Route path="/rule-cards/:ruleCardId" element={<RuleCardPage />} />
    </Routes>,
    { me: desk, at: `/rule-cards/${draft.id}?mode=change`, widthPx: 1440 },
  );
  return sent;
}

const saved = (sent: ReturnType<typeof stubApi>) =>
  (sent.find(({ method }) => method === 'PUT')?.body as { content: RuleCardContent } | undefined)?.content;
const save = () => userEvent.click(screen.getByRole('button', { name: 'Save rule card 7' }));

// issue "Rule cards", bad input: "each refused with words on its field"
describe('the form of a draft', () => {
  it('saves what is typed, and names a fault at its field', async () => {
    const sent = open();
    const second = await screen.findByRole('group', { name: 'Window 2' });
    const end = within(second).getByLabelText('To');
    await userEvent.clear(end);
    await userEvent.type(end, '10:00');
    await save();
    expect(within(second).getByText('It ends before it starts.')).toBeInTheDocument();
    await waitFor(() => expect(end).toHaveFocus());
    expect(saved(sent)).toBeUndefined();
    await userEvent.click(within(second).getByRole('button', { name: 'Take out Window 2' }));
    await save();
    await waitFor(() => expect(saved(sent)).toBeDefined());
    // Re-inspections were in the window that went: every window is open to them again.
    expect(saved(sent)?.asking).toMatchObject({ windows: [{ label: 'early', room: 4 }], reinspectionWindows: null });
  });

  it('saves a window nobody works and a rating of zero only with a mark on them, or not at all', async () => {
    const sent = open();
    const second = await screen.findByRole('group', { name: 'Window 2' });
    for (const day of ['Mon', 'Tue', 'Wed', 'Thu', 'Sun'])
      await userEvent.click(within(second).getByRole('checkbox', { name: day }));
    await save();
    expect(await within(second).findByText('Nobody works on these days.')).toBeInTheDocument();
    expect(saved(sent)?.asking.windows[1]?.days).toEqual([7]);
    const minimum = screen.getByDisplayValue('100');
    await userEvent.clear(minimum);
    await userEvent.type(minimum, '0');
    await save();
    expect(screen.getByText('More than zero.')).toBeInTheDocument();
    expect(sent.filter(({ method }) => method === 'PUT')).toHaveLength(1);
  });

  it('says at the method that none is accepted', async () => {
    const sent = open();
    const [dwv] = await screen.findAllByRole('group', { name: 'DWV', hidden: true });
    for (const method of ['attic cut', 'stack to roof'])
      await userEvent.click(within(dwv!).getByRole('checkbox', { name: method, hidden: true }));
    await save();
    expect(within(dwv!).getByText('At least one accepted method.')).toBeInTheDocument();
    await waitFor(() => expect(within(dwv!).getByRole('checkbox', { name: 'stack to roof' })).toHaveFocus());
    expect(saved(sent)).toBeUndefined();
  });

  it('takes over what a model code says, with its section, and is local again once typed', async () => {
    const sent = open();
    const [use] = await screen.findAllByRole('button', { name: /Use IRC P2503.7: 15 min/, hidden: true });
    await userEvent.click(use!);
    expect(screen.getByText('From IRC P2503.7.')).toBeInTheDocument();
    await save();
    await waitFor(() =>
      expect(saved(sent)?.sources).toEqual({ 'tests.1.standMinutes': { from: 'IRC', section: 'P2503.7' } }),
    );
    expect(saved(sent)?.tests[1]?.standMinutes).toBe(15);
    const water = screen.getAllByRole('group', { name: 'Water', hidden: true })[0]!;
    await userEvent.type(within(water).getByLabelText(/To stand/), '0');
    await save();
    await waitFor(() => expect(sent.filter(({ method }) => method === 'PUT')).toHaveLength(2));
    const last = sent.filter(({ method }) => method === 'PUT').at(-1)?.body as { content: RuleCardContent };
    expect(last.content.sources).toEqual({});
    expect(last.content.tests[1]?.standMinutes).toBe(150);
  });

  it('adds and takes out a system of a stage with its test', async () => {
    const sent = open();
    const tested = await screen.findByRole('group', { name: 'Tested', hidden: true });
    await userEvent.click(within(tested).getByRole('checkbox', { name: 'Water', hidden: true }));
    await save();
    await waitFor(() => expect(saved(sent)?.tests.map(({ system }) => system)).toEqual(['dwv']));
  });

  it('cannot be published while parts do not fit, and says how many', async () => {
    open({ ...content, asking: { ...content.asking, reinspectionWindows: ['dusk'] } });
    const publish = await screen.findByRole('button', { name: /Publish rule card 7/ });
    expect(publish).toHaveTextContent('1 thing does not fit yet');
    await userEvent.click(publish);
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument();
  });

  it('puts the server’s word at the field', async () => {
    open(content, {
      [`PUT /api/rule-cards/${draft.id}`]: () =>
        refusal('bad-input', { fields: { 'content.asking.cutoff': 'not-a-clock-time' } }),
    });
    await screen.findByRole('group', { name: 'Window 2' });
    await save();
    expect(await screen.findByText('A clock time in 24 h, like 07:30.')).toBeInTheDocument();
    await waitFor(() => expect(screen.getByLabelText('Cut-off')).toHaveFocus());
  });
});
