import { lazy, type ComponentType, type LazyExoticComponent, type ReactNode } from 'react';
import type { RouteObject } from 'react-router-dom';
import { Gate } from './gate';
import { Landing } from './landing';
import { NotFoundPage } from './not-found-page';
import { RouteError } from './route-error';
import type { RouteHandle } from './route-handle';

type Page = ComponentType<Record<never, never>>;

/** A page in a file of its own, fetched when it is first opened. */
function page<Name extends string>(name: Name, load: () => Promise<Record<Name, Page>>): ReactNode {
  const Lazy: LazyExoticComponent<Page> = lazy(async () => ({ default: (await load())[name] }));
  return <Lazy />;
}

const frame = page('Frame', () => import('./layout/frame'));
const openLayout = page('OpenLayout', () => import('./layout/open-layout'));
const signIn = page('SignInPage', () => import('../features/accounts/pages/sign-in-page'));
const link = page('LinkPage', () => import('../features/accounts/pages/link-page'));
const people = page('PeoplePage', () => import('../features/accounts/pages/people-page'));
const settings = page('SettingsPage', () => import('../features/accounts/pages/settings-page'));
const calendar = page('CalendarPage', () => import('../features/visits/pages/calendar-page'));
const requests = page('RequestsPage', () => import('../features/visits/pages/requests-page'));
const dayBoard = page('DayBoardPage', () => import('../features/visits/pages/day-board-page'));
const run = page('RunPage', () => import('../features/visits/pages/run-page'));
const outcome = page('OutcomePage', () => import('../features/outcomes/pages/outcome-page'));
const corrections = page('CorrectionsPage', () => import('../features/outcomes/pages/corrections-page'));
const lots = page('LotsPage', () => import('../features/lots/pages/lots-page'));
const lotForm = page('LotFormPage', () => import('../features/lots/pages/lot-form-page'));
const lotImport = page('LotImportPage', () => import('../features/lots/pages/lot-import-page'));
const houseModels = page('HouseModelsPage', () => import('../features/lots/pages/house-models-page'));
const houseModel = page('HouseModelPage', () => import('../features/lots/pages/house-model-page'));
const houseModelForm = page('HouseModelFormPage', () => import('../features/lots/pages/house-model-form-page'));
const houseApply = page('HouseApplyPage', () => import('../features/lots/pages/house-apply-page'));
const lotSheet = page('LotSheetPage', () => import('../features/lots/pages/lot-sheet-page'));
const plan = page('PlanPage', () => import('../features/plans/pages/plan-page'));
const consents = page('ConsentsPage', () => import('../features/lots/pages/consents-page'));
const pastLots = page('PastLotsPage', () => import('../features/lots/pages/past-lots-page'));
const pastLot = page('PastLotPage', () => import('../features/lots/pages/past-lot-page'));
const testUp = page('TestUpPage', () => import('../features/holds/pages/test-up-page'));
const thread = page('ThreadPage', () => import('../features/threads/pages/thread-page'));
const ruleCard = page('RuleCardPage', () => import('../features/departments/pages/rule-card-page'));
const notices = page('NoticesPage', () => import('../features/notices/pages/notices-page'));
const organizations = page('OrganizationsPage', () => import('../features/operations/pages/organizations-page'));
const deliveries = page('DeliveriesPage', () => import('../features/operations/pages/deliveries-page'));
const ledger = page('LedgerPage', () => import('../features/operations/pages/ledger-page'));

const task: RouteHandle = { isTask: true };

const open: RouteHandle = { isOpen: true };

/** Pages inside a frame. All but the open ones are for people who are signed in. */
const framedRoutes: RouteObject[] = [
  { path: '/', element: <Landing /> },
  { path: '/calendar', element: calendar },
  { path: '/requests', element: requests },
  { path: '/day', element: dayBoard },
  { path: '/run', element: run },
  { path: '/visits/:visitId/outcome', element: outcome, handle: task },
  { path: '/corrections', element: corrections },
  { path: '/lots', element: lots },
  { path: '/lots/new', element: lotForm },
  { path: '/lots/import', element: lotImport },
  { path: '/lots/houses', element: houseModels },
  { path: '/lots/houses/new', element: houseModelForm },
  { path: '/lots/houses/:houseModelId', element: houseModel },
  { path: '/lots/houses/:houseModelId/edit', element: houseModelForm },
  { path: '/lots/houses/:houseModelId/apply', element: houseApply },
  { path: '/lots/:lotId', element: lotSheet },
  { path: '/lots/:lotId/edit', element: lotForm },
  { path: '/lots/:lotId/plan', element: plan, handle: task },
  { path: '/lots/:lotId/test', element: testUp, handle: task },
  { path: '/lots/:lotId/thread', element: thread, handle: task },
  { path: '/past-lots', element: pastLots },
  { path: '/past-lots/:lotId', element: pastLot },
  { path: '/notices', element: notices },
  { path: '/people', element: people },
  { path: '/settings', element: settings },
  { path: '/consents', element: consents },
  { path: '/operations/organizations', element: organizations },
  { path: '/operations/deliveries', element: deliveries },
  { path: '/operations/ledger', element: ledger },
  { path: '/rule-cards', element: ruleCard, handle: open },
  { path: '/rule-cards/:ruleCardId', element: ruleCard, handle: open },
  { path: '*', element: <NotFoundPage />, handle: open },
];

export const routes: RouteObject[] = [
  {
    errorElement: <RouteError />,
    children: [
      { path: '/sign-in', element: signIn },
      { path: '/link/:kind', element: link },
      {
        element: <Gate frame={frame} openFrame={openLayout} />,
        children: [{ errorElement: <RouteError />, children: framedRoutes }],
      },
    ],
  },
];
