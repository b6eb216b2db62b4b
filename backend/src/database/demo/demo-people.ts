import type { MemberRole, OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';

/** One password for every demo person; the demo listens on loopback only. */
export const demoPassword = 'the needle stays put';

export interface DemoOrganization {
  key: string;
  name: string;
  kind: OrganizationKind;
  phone: string;
}

export const demoOrganizations = [
  { key: 'odderly', name: 'Odderly Homes', kind: 'builder', phone: '555-0140' },
  { key: 'penmarrow', name: 'Penmarrow Builders', kind: 'builder', phone: '555-0147' },
  { key: 'dunlatch', name: 'Dunlatch Plumbing', kind: 'plumber', phone: '555-0115' },
  { key: 'merrow', name: 'Merrow Pipe and Drain', kind: 'plumber', phone: '555-0121' },
  { key: 'two-bells', name: 'Two Bells Plumbing', kind: 'plumber', phone: '555-0126' },
  { key: 'tallowmere', name: 'Tallowmere Building Dept.', kind: 'department', phone: '555-0160' },
  { key: 'vennick', name: 'Vennick County', kind: 'department', phone: '555-0170' },
  { key: 'ashquill', name: 'Ashquill Building Office', kind: 'department', phone: '555-0180' },
  { key: 'corrow', name: 'Corrow Township', kind: 'department', phone: '555-0190' },
] as const satisfies readonly DemoOrganization[];

export type DemoOrganizationKey = (typeof demoOrganizations)[number]['key'];

export interface DemoPerson {
  key: string;
  name: string;
  email: string;
  phone: string;
  locale: 'en' | 'es';
  memberships: Array<{ organization: DemoOrganizationKey; roles: MemberRole[] }>;
  isOperator?: boolean;
}

const person = (
  key: string,
  name: string,
  organization: DemoOrganizationKey,
  roles: MemberRole[],
  phone: string,
  locale: 'en' | 'es' = 'en',
): DemoPerson => ({
  key,
  name,
  email: `${key}@${organization}.example.test`,
  phone,
  locale,
  memberships: [{ organization, roles }],
});

export const demoPeople: readonly DemoPerson[] = [
  person('della', 'Della Arkwright', 'odderly', ['superintendent'], '555-0142'),
  person('corin', 'Corin Vale', 'odderly', ['owner'], '555-0141'),
  person('hal', 'Hal Brightmoor', 'penmarrow', ['superintendent', 'owner'], '555-0148'),
  person('ruben', 'Ruben Achterberg', 'dunlatch', ['plumber'], '555-0117'),
  person('ida', 'Ida Malloway', 'dunlatch', ['plumber', 'owner'], '555-0119'),
  person('teo', 'Teo Salcedo', 'dunlatch', ['helper'], '555-0118', 'es'),
  person('sunniva', 'Sunniva Merrow', 'merrow', ['plumber', 'owner'], '555-0122'),
  person('anselm', 'Anselm Bell', 'two-bells', ['plumber', 'owner'], '555-0127'),
  person('wes', 'Wes Pomfret', 'tallowmere', ['desk'], '555-0161'),
  person('noor', 'Noor Haverty', 'tallowmere', ['inspector'], '555-0163'),
  person('gil', 'Gil Strand', 'tallowmere', ['inspector'], '555-0165'),
  person('ines', 'Ines Calloway', 'tallowmere', ['inspector'], '555-0166'),
  person('bo', 'Bo Lindgard', 'tallowmere', ['inspector'], '555-0164'),
  person('maren', 'Maren Tolliver', 'tallowmere', ['owner'], '555-0162'),
  person('perrin', 'Perrin Holt', 'vennick', ['desk', 'owner'], '555-0171'),
  person('tamsin', 'Tamsin Orde', 'vennick', ['inspector'], '555-0172'),
  person('yara', 'Yara Quist', 'ashquill', ['desk', 'inspector', 'owner'], '555-0181'),
  {
    key: 'operator',
    name: 'Otis Grane',
    email: 'otis@holdwater.example.test',
    phone: '555-0101',
    locale: 'en',
    memberships: [],
    isOperator: true,
  },
];

/** The installation's own name beside its operator. */
export const installationName = 'Holdwater installation';

/** For each role the one a newcomer should sign in as first. */
const firstOfRole = ['della', 'ruben', 'teo', 'noor', 'wes', 'corin', 'operator'];

export interface DemoSignIn {
  email: string;
  password: string;
  role: string;
  organization: string;
}

/** Every demo sign-in, one line a role, the first of each role before the others. */
export function demoSignIns(): DemoSignIn[] {
  const named = new Map<string, string>(demoOrganizations.map((each) => [each.key, each.name]));
  const lines = demoPeople.flatMap((each) => {
    const base = { email: each.email, password: demoPassword };
    if (each.isOperator) return [{ ...base, role: 'operator', organization: installationName, key: each.key }];
    return each.memberships.flatMap((membership) =>
      membership.roles.map((role) => ({
        ...base,
        role,
        organization: named.get(membership.organization) ?? '',
        key: each.key,
      })),
    );
  });
  const rank = (key: string) => (firstOfRole.includes(key) ? firstOfRole.indexOf(key) : firstOfRole.length);
  return lines.sort((a, b) => rank(a.key) - rank(b.key)).map(({ key: _key, ...line }) => line);
}
