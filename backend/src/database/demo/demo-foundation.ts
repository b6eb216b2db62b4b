import { randomUUID } from 'node:crypto';
import { hash } from '@node-rs/argon2';
import { QueryTypes } from 'sequelize';
import type { Sequelize } from 'sequelize-typescript';
import { MembershipModel } from '../../accounts/membership.model.js';
import { OrganizationModel } from '../../accounts/organization.model.js';
import { PersonModel } from '../../accounts/person.model.js';
import { SessionModel } from '../../accounts/session.model.js';
import { Temporal } from 'temporal-polyfill';
import { DepartmentModel } from '../../departments/department.model.js';
import { RuleCardModel } from '../../departments/rule-card.model.js';
import { demoOrganizations, demoPassword, demoPeople, type DemoOrganizationKey } from './demo-people.js';
import { demoDepartments, type DemoDepartment } from './demo-rule-cards.js';

/** What the story needs to know of the people and organizations it is told about. */
export interface DemoFoundation {
  organizationId(key: DemoOrganizationKey): string;
  personId(key: string): string;
  sessionId(key: string): string;
  ruleCards: Map<DemoOrganizationKey, { workingDays: readonly number[] }>;
}

/** argon2id as the accounts use it: m 47104 KiB, t 1, p 1 (OWASP). */
const hashing = { memoryCost: 47_104, timeCost: 1, parallelism: 1 };

/** Writes organizations, people, departments and their published rule cards as they stood at `since`. */
export async function layFoundation(db: Sequelize, since: Date, present: Date): Promise<DemoFoundation> {
  const organizationIds = await makeOrganizations(since);
  const { personIds, sessionIds } = await makePeople(organizationIds, since, present);
  const ruleCards: DemoFoundation['ruleCards'] = new Map();
  for (const department of demoDepartments) {
    const id = known(organizationIds, department.key);
    await DepartmentModel.create({
      id,
      zone: department.zone,
      elevationFt: department.elevationFt,
      isOutside: department.isOutside,
    });
    if (!department.ruleCard) continue;
    const content = openToday(department.ruleCard.content, department.zone, present);
    ruleCards.set(department.key, { workingDays: content.asking.workingDays });
    const from = since.toISOString().slice(0, 10);
    await publish(db, id, department.ruleCard.version, content, since, [from, null]);
    await tellEarlier(db, id, department.earlier ?? [], since);
    if (department.draft !== undefined) {
      const draft = openToday(department.draft, department.zone, present);
      await layDraft(id, department.ruleCard.version + 1, draft, known(personIds, 'wes'), present);
    }
  }
  return {
    organizationId: (key) => known(organizationIds, key),
    personId: (key) => known(personIds, key),
    sessionId: (key) => known(sessionIds, key),
    ruleCards,
  };
}

async function makeOrganizations(at: Date): Promise<Map<string, string>> {
  const ids = new Map<string, string>();
  for (const each of demoOrganizations) {
    const id = randomUUID();
    await OrganizationModel.create({ id, name: each.name, kind: each.kind, phone: each.phone, createdAt: at });
    ids.set(each.key, id);
  }
  return ids;
}

async function makePeople(organizationIds: Map<string, string>, at: Date, present: Date) {
  const personIds = new Map<string, string>();
  const sessionIds = new Map<string, string>();
  const passwordHash = await hash(demoPassword, hashing);
  for (const each of demoPeople) {
    const id = randomUUID();
    await PersonModel.create({
      id,
      email: each.email,
      name: each.name,
      phone: each.phone,
      passwordHash,
      locale: each.locale,
      units: 'us',
      isOperator: each.isOperator ?? false,
      isDisabled: false,
      createdAt: at,
    });
    for (const { organization, roles } of each.memberships) {
      await MembershipModel.create({
        id: randomUUID(),
        personId: id,
        organizationId: known(organizationIds, organization),
        roles,
        isDisabled: false,
        createdAt: at,
      });
    }
    // a session for telling the past; it ends with the story
    const session = await SessionModel.create({ id: randomUUID(), personId: id, createdAt: at, expiresAt: present });
    personIds.set(each.key, id);
    sessionIds.set(each.key, session.id);
  }
  return { personIds, sessionIds };
}

/** The demo has a day's run whatever today is: a department that would be off today works today. */
function openToday<T extends (typeof demoDepartments)[number]['ruleCard']>(
  content: NonNullable<T>['content'],
  zone: string,
  present: Date,
) {
  const local = new Intl.DateTimeFormat('en-CA', { timeZone: zone, dateStyle: 'short' }).format(present);
  const weekday = new Date(`${local}T12:00:00Z`).getUTCDay() || 7;
  const workingDays = content.asking.workingDays.includes(weekday)
    ? content.asking.workingDays
    : [...content.asking.workingDays, weekday];
  return {
    ...content,
    asking: { ...content.asking, workingDays, holidays: { ...content.asking.holidays, drops: [local] } },
  };
}

async function publish(
  db: Sequelize,
  departmentId: string,
  version: number,
  content: object,
  since: Date,
  [from, to]: readonly [from: string, to: string | null],
): Promise<void> {
  await db.query(
    `INSERT INTO rule_cards (id, department_id, version, state, content, effective, created_at, published_at)
     VALUES (:id, :departmentId, :version, 'published', :content, daterange(:from, :to), :since, :since)`,
    {
      replacements: {
        id: randomUUID(),
        departmentId,
        version,
        content: JSON.stringify(content),
        from,
        to,
        since,
      },
      type: QueryTypes.INSERT,
    },
  );
}

/** The versions that were replaced: each ended on the day the next began. */
async function tellEarlier(
  db: Sequelize,
  departmentId: string,
  earlier: NonNullable<DemoDepartment['earlier']>,
  since: Date,
): Promise<void> {
  let to = Temporal.PlainDate.from(since.toISOString().slice(0, 10));
  for (const { version, content, days } of earlier) {
    const from = to.subtract({ days });
    const at = new Date(`${from.toString()}T16:00:00Z`);
    await publish(db, departmentId, version, content, at, [from.toString(), to.toString()]);
    to = from;
  }
}

async function layDraft(departmentId: string, version: number, content: object, editedBy: string, at: Date) {
  await RuleCardModel.create({
    ...{ id: randomUUID(), departmentId, version, state: 'draft', content, effective: null },
    ...{ createdBy: editedBy, createdAt: at, editedBy, editedAt: at },
  });
}

function known(ids: Map<string, string>, key: string): string {
  const id = ids.get(key);
  if (!id) throw new Error(`the demo knows no ${key}`);
  return id;
}
