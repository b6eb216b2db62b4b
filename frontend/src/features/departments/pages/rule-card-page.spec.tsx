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

const touches = {
  keptVisits: { booked: 26, requested: 1, versions: [6] },
  lotsWithoutVisit: 18,
  told: [{ organizationId: tallowmere.id, name: 'Odderly Homes', people: 3 }],
  unfitPlans: [
    {
      ...{ lotId: draft.id, lotNumber: '17', tractName: 'Sorrel Bench', stageCode: 'rough-in' },
      ...{ system: 'water', reason: 'pressure' },
    },
  ],
};

function answers(abilities: { canEditRuleCards: boolean; canClose: boolean }, hasDraft = true) {
  const inForce = briefOf(6, 'published');
  return {
    'GET /api/departments': () => ({ data: { items: [department] } }),
    [`GET /api/departments/${tallowmere.id}`]: () => ({
      data: { department, ruleCards: hasDraft ? [draft, inForce] : [inForce], closures: [], abilities },
    }),
    [`GET /api/rule-cards/${inForce.id}`]: () => ({ data: cardOf(6, 'published') }),
    [`GET /api/rule-cards/${draft.id}`]: () => ({ data: cardOf(7, 'draft', changed) }),
    [`GET /api/rule-cards/${draft.id}/touches`]: () => ({ data: touches }),
  };
}

function open(at: string, me: typeof desk | null = desk, widthPx = 1440) {
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
  it('is read by anyone in one column, through the public routes alone', async () => {
    const inForce = briefOf(6, 'published');
    const sent = stubApi({
      'GET /api/public/rule-cards': () => ({ data: { items: [department] } }),
      [`GET /api/public/rule-cards/${inForce.id}`]: () => ({ data: cardOf(6, 'published') }),
    });
    open('/rule-cards', null, 390);
    expect(await screen.findByRole('heading', { level: 1 })).toHaveTextContent('Rule cards');
    await userEvent.click(screen.getByRole('link', { name: /Tallowmere/ }));
    expect(await screen.findByRole('heading', { level: 1, name: /rule card 6/ })).toHaveTextContent(
      'Tallowmere Building Department, rule card 6',
    );
    expect(sent.every(({ path }) => path.startsWith('/api/public/'))).toBe(true);
    // interface §5: "Public: one version, no side columns"
    expect(screen.queryByRole('navigation', { name: 'Departments and versions' })).not.toBeInTheDocument();
    expect(screen.queryByRole('complementary')).not.toBeInTheDocument();
    expect(screen.queryByRole('button')).not.toBeInTheDocument();
  });

  it('stands at the address of its department, too', async () => {
    stubApi({
      'GET /api/public/rule-cards': () => ({ data: { items: [department] } }),
      [`GET /api/public/rule-cards/${briefOf(6, 'published').id}`]: () => ({ data: cardOf(6, 'published') }),
    });
    open(`/rule-cards/${tallowmere.id}`, null, 390);
    expect(await screen.findByRole('heading', { level: 1, name: /rule card 6/ })).toBeInTheDocument();
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

  it('shows only what changed, or everything, against the version chosen', async () => {
    const fifth = { ...briefOf(5, 'published'), isInForce: false, effectiveTo: '2026-01-01' };
    const older = { ...content, readiness: { ...content.readiness, isExtensionAllowed: false } };
    const base = answers(may);
    stubApi({
      ...base,
      [`GET /api/departments/${tallowmere.id}`]: () => ({
        data: { department, ruleCards: [draft, briefOf(6, 'published'), fifth], closures: [], abilities: may },
      }),
      [`GET /api/rule-cards/${fifth.id}`]: () => ({ data: cardOf(5, 'published', older) }),
    });
    open(`/rule-cards/${draft.id}`);
    const changedOnly = await screen.findByRole('radio', { name: 'Changed' });
    const rows = document.querySelectorAll('.notes-sheet dt').length;
    expect(rows).toBeGreaterThan(20);
    expect(screen.getByText(`1 of ${rows}`)).toBeInTheDocument();
    await userEvent.click(changedOnly);
    expect(document.querySelectorAll('.notes-sheet dt')).toHaveLength(1);
    expect(screen.queryByRole('region', { name: /Test up/ })).not.toBeInTheDocument();
    await userEvent.selectOptions(screen.getByLabelText('Beside it'), 'Rule card 5');
    const testUp = await screen.findByRole('region', { name: /Test up/ });
    expect(testUp).toHaveTextContent('ExtensionNoneOne may be asked');
    expect(testUp.querySelector('ins')).toHaveTextContent('One may be asked');
    await userEvent.selectOptions(screen.getByLabelText('Beside it'), 'no other version');
    expect(screen.queryByText('(changed)')).not.toBeInTheDocument();
  });

  it('says what a draft touches once it is in force', async () => {
    stubApi(answers(may));
    open(`/rule-cards/${draft.id}`);
    const panel = await screen.findByRole('region', { name: 'When rule card 7 is in force' });
    expect(await within(panel).findByText('27 open visits stay on rule card 6.')).toBeInTheDocument();
    expect(panel).toHaveTextContent('18 lots without a visit will be planned on rule card 7.');
    expect(within(panel).getByText(/1 test plan does not fit/)).toBeInTheDocument();
    expect(within(panel).getByRole('link', { name: 'Lot 17, Sorrel Bench' })).toHaveAttribute(
      'href',
      `/lots/${draft.id}`,
    );
    expect(panel).toHaveTextContent('Rough-in, Water: another pressure');
  });

  it('is read as a plumber or the public reads it: without the draft and the desk’s acts', async () => {
    stubApi(answers(may));
    open(`/rule-cards/${draft.id}`);
    await userEvent.click(await screen.findByRole('radio', { name: 'Public' }));
    expect(await screen.findByRole('status')).toHaveTextContent('Rule card 7 is a draft');
    expect(await screen.findByRole('heading', { level: 1, name: /rule card 6/ })).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /Publish/ })).not.toBeInTheDocument();
    expect(screen.queryByRole('navigation', { name: 'Departments and versions' })).not.toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Back to the desk' }));
    expect(await screen.findByRole('button', { name: /Publish rule card 7/ })).toBeInTheDocument();
  });

  it('is thrown away after one question', async () => {
    const sent = stubApi({ ...answers(may), [`DELETE /api/rule-cards/${draft.id}`]: () => ({ data: { done: true } }) });
    open(`/rule-cards/${draft.id}`);
    await userEvent.click(await screen.findByRole('button', { name: 'Throw rule card 7 away' }));
    const dialog = screen.getByRole('dialog', { name: 'Throw the draft of rule card 7 away?' });
    expect(sent.some(({ method }) => method === 'DELETE')).toBe(false);
    await userEvent.click(within(dialog).getByRole('button', { name: 'Throw rule card 7 away' }));
    await waitFor(() => expect(sent.some(({ method }) => method === 'DELETE')).toBe(true));
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
    expect(dialog).toHaveTextContent('Told of what changes for them:');
    expect(await within(dialog).findByText('Odderly Homes, 3 people')).toBeInTheDocument();
    expect(dialog).toHaveTextContent(
      '27 open visits stay on the rule card they have. 1 test plan is to be chosen again.',
    );
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
