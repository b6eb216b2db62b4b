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
const changed = { ...content, asking: { ...content.asking, cutoff: '14:00' } };

function answers(abilities: { canEditRuleCards: boolean; canClose: boolean }, hasDraft = true) {
  const inForce = briefOf(6, 'published');
  return {
    'GET /api/departments': () => ({ data: { items: [department] } }),
    [`GET /api/departments/${tallowmere.id}`]: () => ({
      data: { department, ruleCards: hasDraft ? [draft, inForce] : [inForce], closures: [], abilities },
    }),
    [`GET /api/rule-cards/${inForce.id}`]: () => ({ data: cardOf(6, 'published') }),
    [`GET /api/rule-cards/${draft.id}`]: () => ({ data: cardOf(7, 'draft', changed) }),
  };
}

function open(at: string, me = desk, widthPx = 1440) {
  return renderPage(
    <Routes>
      <Route path="/rule-cards" element={<RuleCardPage />} />
      <Route path="/rule-cards/:ruleCardId" element={<RuleCardPage />} />
    </Routes>,
    { me, at, widthPx },
  );
}

const may = { canEditRuleCards: true, canClose: true };
const mayNot = { canEditRuleCards: false, canClose: false };

describe('a rule card', () => {
  it('is read by anyone, through the public routes alone', async () => {
    const sent = stubApi({
      'GET /api/public/rule-cards': () => ({ data: { items: [department] } }),
      [`GET /api/public/rule-cards/${briefOf(6, 'published').id}`]: () => ({ data: cardOf(6, 'published') }),
    });
    renderPage(
      <Routes>
        <Route path="/rule-cards" element={<RuleCardPage />} />
      </Routes>,
      { me: null, at: '/rule-cards', widthPx: 390 },
    );
    expect(await screen.findByRole('heading', { level: 1 })).toHaveTextContent(
      'Tallowmere Building Department, rule card 6',
    );
    expect(sent.every(({ path }) => path.startsWith('/api/public/'))).toBe(true);
    expect(screen.queryByRole('button', { name: /Publish|New draft|Close it/ })).not.toBeInTheDocument();
  });

  it('says its notes in words', async () => {
    stubApi(answers(mayNot, false));
    open('/rule-cards');
    const asked = await screen.findByRole('region', { name: /Windows and requests/ });
    // Words and clock times of interface guide §9; the values are those given above.
    expect(asked).toHaveTextContent('7:30–9:00 am, every working day, room for 4');
    expect(asked).toHaveTextContent('11:00 am–1:00 pm, Mon–Thu, room for 1');
    expect(asked).toHaveTextContent('3:00 pm, 1 working day before');
    expect(screen.getByRole('region', { name: /Water/ })).toHaveTextContent('100 psi with water, better 120 psi');
    expect(screen.getByRole('region', { name: /Fees/ })).toHaveTextContent('First one free, then $65');
    expect(screen.getByRole('region', { name: /Test up/ })).toHaveTextContent('7:00 am on the day');
  });

  it('shows the acts of the desk only where the server allows them', async () => {
    stubApi(answers(mayNot));
    open('/rule-cards');
    await screen.findByText(/No closures to come/);
    expect(screen.queryByRole('button', { name: 'Close it' })).not.toBeInTheDocument();
    expect(screen.queryByRole('link', { name: 'Open the draft' })).not.toBeInTheDocument();
  });

  it('clouds what a draft changes against the version in force', async () => {
    stubApi(answers(may));
    open(`/rule-cards/${draft.id}`);
    expect(await screen.findByText('(changed)')).toBeInTheDocument();
    expect(screen.getAllByText('(changed)')).toHaveLength(1);
    expect(screen.getByText('(changed)').parentElement).toHaveTextContent('2:00 pm, 1 working day before');
  });

  it('saves the windows as typed, and names a fault at its field', async () => {
    const sent = stubApi({
      ...answers(may),
      [`PUT /api/rule-cards/${draft.id}`]: () => ({ data: cardOf(7, 'draft') }),
    });
    open(`/rule-cards/${draft.id}`);
    const second = await screen.findByRole('group', { name: 'Window 2' });
    const end = within(second).getByLabelText('To');
    await userEvent.clear(end);
    await userEvent.type(end, '10:00');
    await userEvent.click(screen.getByRole('button', { name: 'Save rule card 7' }));
    expect(within(second).getByText('It ends before it starts.')).toBeInTheDocument();
    await waitFor(() => expect(end).toHaveFocus());
    expect(sent.some(({ method }) => method === 'PUT')).toBe(false);
    await userEvent.click(within(second).getByRole('button', { name: 'Take out midday' }));
    await userEvent.click(screen.getByRole('button', { name: 'Save rule card 7' }));
    await waitFor(() => expect(sent.find(({ method }) => method === 'PUT')).toBeDefined());
    // Re-inspections were in the window that went: every window is open to them again.
    expect(sent.find(({ method }) => method === 'PUT')?.body).toMatchObject({
      content: { asking: { windows: [{ label: 'early', room: 4 }], cutoff: '14:00', reinspectionWindows: null } },
    });
  });

  it('is published only after a question, and a refusal stands in it', async () => {
    const sent = stubApi({
      ...answers(may),
      [`POST /api/rule-cards/${draft.id}/publish`]: () =>
        refusal('rule-card-overlap', { fields: { effectiveFrom: 'taken' } }),
    });
    open(`/rule-cards/${draft.id}`);
    await userEvent.click(await screen.findByRole('button', { name: 'Publish rule card 7' }));
    const dialog = screen.getByRole('dialog', { name: /Publish rule card 7 from/ });
    expect(dialog).toHaveTextContent('Builders and plumbers with an open visit are told');
    expect(sent.some(({ method }) => method === 'POST')).toBe(false);
    await userEvent.click(within(dialog).getByRole('button', { name: 'Publish rule card 7' }));
    expect(await within(dialog).findByRole('alert')).toHaveTextContent('Another rule card begins on that day');
  });

  it('closes a day only after a question that says who is told', async () => {
    const sent = stubApi(answers(may, false));
    open('/rule-cards');
    await userEvent.click(await screen.findByRole('button', { name: 'Close it' }));
    expect(screen.getByLabelText('Why')).toBeInvalid();
    await userEvent.type(screen.getByLabelText('Day'), '2031-04-16');
    await userEvent.type(screen.getByLabelText('Why'), 'Training');
    await userEvent.click(screen.getByRole('button', { name: 'Close it' }));
    expect(screen.getByRole('dialog', { name: 'Close Wed, Apr 16, 2031?' })).toHaveTextContent(
      'Open visits inside it are freed',
    );
    expect(sent.some(({ method }) => method === 'POST')).toBe(false);
  });
});
