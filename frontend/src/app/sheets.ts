import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import type { IconName } from '../components/icon';

/** The sheets of the top bar. Their words: `app.sheets.<id>`. */
export type SheetId =
  | 'run'
  | 'dayBoard'
  | 'calendar'
  | 'requests'
  | 'lots'
  | 'corrections'
  | 'ruleCards'
  | 'organizations'
  | 'deliveries'
  | 'ledger';

export interface Sheet {
  readonly id: SheetId;
  readonly path: string;
  readonly icon: IconName;
}

/** Who works now: the roles merged within the chosen organization, or the operator of the installation. */
export interface Worker {
  readonly roles: readonly MemberRole[];
  readonly isOperatorFrame: boolean;
}

interface SheetRule extends Sheet {
  readonly roles: readonly MemberRole[];
}

const builders = ['superintendent', 'plumber', 'helper'] as const satisfies readonly MemberRole[];

/** In the order of the top bar: the union of the roles keeps it. */
const sheetRules: readonly SheetRule[] = [
  { id: 'run', path: '/run', icon: 'run', roles: ['inspector'] },
  { id: 'dayBoard', path: '/day', icon: 'clock', roles: ['desk'] },
  { id: 'calendar', path: '/calendar', icon: 'calendar', roles: [...builders, 'inspector', 'desk'] },
  { id: 'requests', path: '/requests', icon: 'mail', roles: ['desk'] },
  { id: 'lots', path: '/lots', icon: 'lots', roles: [...builders, 'inspector', 'desk'] },
  { id: 'corrections', path: '/corrections', icon: 'corrections', roles: builders },
  { id: 'ruleCards', path: '/rule-cards', icon: 'record', roles: [...builders, 'inspector', 'desk', 'owner'] },
];

const operatorSheets: readonly Sheet[] = [
  { id: 'organizations', path: '/operations/organizations', icon: 'person' },
  { id: 'deliveries', path: '/operations/deliveries', icon: 'mail' },
  { id: 'ledger', path: '/operations/ledger', icon: 'record' },
];

/** The top bar of a worker, in its order; the place in it is the key that opens it. */
export function sheetsFor({ roles, isOperatorFrame }: Worker): readonly Sheet[] {
  if (isOperatorFrame) return operatorSheets;
  return sheetRules.filter((sheet) => sheet.roles.some((role) => roles.includes(role)));
}

/** Where each role starts its day; the order is that of the top bar. */
const landings: readonly (readonly [MemberRole, string])[] = [
  ['inspector', '/run'],
  ['desk', '/day'],
  ['superintendent', '/calendar'],
  ['plumber', '/calendar'],
  ['helper', '/calendar'],
  ['owner', '/people'],
];

/** The pages a worker may start on, in order; the first with something due today is it. */
export function landingsFor({ roles, isOperatorFrame }: Worker): string[] {
  if (isOperatorFrame) return ['/operations/organizations'];
  const paths = landings.filter(([role]) => roles.includes(role)).map(([, path]) => path);
  const unique = [...new Set(paths)];
  // An owner lands on People only without another role.
  const working = unique.filter((path) => path !== '/people');
  return working.length > 0 ? working : unique.length > 0 ? unique : ['/rule-cards'];
}

/** Phone bars that are not simply the first three of the top bar. */
const deskAlone: readonly SheetId[] = ['dayBoard', 'requests', 'lots'];

/** The phone bar but for Notices: the landing page and the next two. The rest is under the name. */
export function phoneSheetsFor(worker: Worker): readonly Sheet[] {
  const sheets = sheetsFor(worker);
  const isDeskAlone = worker.roles.includes('desk') && !worker.roles.includes('inspector');
  const wanted = isDeskAlone ? sheets.filter((sheet) => deskAlone.includes(sheet.id)) : sheets;
  return wanted.slice(0, 3);
}

/** The sheet a path lies on, sub-pages included; null for pages of no sheet. */
export function findSheet(sheets: readonly Sheet[], pathname: string): Sheet | null {
  return sheets.find(({ path }) => pathname === path || pathname.startsWith(`${path}/`)) ?? null;
}
