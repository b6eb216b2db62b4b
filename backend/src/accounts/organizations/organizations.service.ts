import { randomUUID } from 'node:crypto';
import type { createOrganization, listOrganizations } from '@holdwater/shared-types/accounts/organizations.contract.js';
import type { OrganizationBrief } from '@holdwater/shared-types/accounts/person.contract.js';
import type { RouteAnswer, RouteInput } from '@holdwater/shared-types/common/route.js';
import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import type { Actor } from '../../common/access/actor.js';
import { refuse } from '../../common/errors/app-error.js';
import { fromCursor, toPage } from '../../common/paging/cursor.js';
import { Clock } from '../../common/time/clock.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { DepartmentModel } from '../../departments/department.model.js';
import { Ledger } from '../../ledger/ledger.service.js';
import { briefOfOrganization } from '../accounts.presenter.js';
import { Invitations } from '../invitations/invitations.service.js';
import { OrganizationModel } from '../organization.model.js';

type NewOrganization = RouteInput<typeof createOrganization>['body'];

/** Finding organizations, and adding one. */
@Injectable()
export class Organizations {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    @InjectModel(OrganizationModel) private readonly organizations: typeof OrganizationModel,
    @InjectModel(DepartmentModel) private readonly departments: typeof DepartmentModel,
    private readonly invitations: Invitations,
    private readonly ledger: Ledger,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  /** By name; `q` matches anywhere in it. Whoever is signed in may find whom to tie to a lot. */
  async list({
    kind,
    q,
    cursor,
    limit,
  }: RouteInput<typeof listOrganizations>['query']): Promise<RouteAnswer<typeof listOrganizations>> {
    const [afterName, afterId] = cursor === undefined ? [null, null] : fromCursor(cursor, 2);
    const like = q === undefined ? null : `%${q.replaceAll(/[\\%_]/g, String.raw`\$&`)}%`;
    const rows = await this.sequelize.query<OrganizationBrief>(
      `SELECT id, name, kind, phone FROM organizations
       WHERE (:kind::text IS NULL OR kind = :kind) AND (:like::text IS NULL OR name ILIKE :like)
         AND (CAST(:afterName AS text) IS NULL OR (name, id::text) > (CAST(:afterName AS text), CAST(:afterId AS text)))
       ORDER BY name, id::text LIMIT :most`,
      { replacements: { kind: kind ?? null, like, afterName, afterId, most: limit + 1 }, type: QueryTypes.SELECT },
    );
    return toPage(rows, limit, (row) => [row.name, row.id]);
  }

  /** Adds it and invites its first owner. Throws `bad-input` for a name in use. */
  async create(actor: Actor, body: NewOrganization): Promise<OrganizationBrief> {
    return this.unitOfWork.run(async () => {
      const { name, kind } = body;
      if (await this.organizations.findOne({ where: { name, kind } })) refuse('bad-input', {}, { name: 'taken' });
      const organization = await this.organizations.create({
        id: randomUUID(),
        name,
        kind,
        phone: body.phone ?? null,
        createdAt: this.clock.now(),
      });
      if (kind === 'department') await this.createDepartment(organization.id, body);
      const by = { personId: actor.personId, role: 'operator' };
      await this.ledger.appendTo('installation', 'organization-added', { name, kind }, by);
      await this.invitations.invite(
        organization,
        { email: body.ownerEmail, name: body.ownerName, roles: ['owner'] },
        by,
      );
      return briefOfOrganization(organization);
    });
  }

  private async createDepartment(id: string, { zone, elevationFt }: NewOrganization): Promise<void> {
    await this.departments.create({ id, zone, elevationFt, isOutside: false });
  }
}
