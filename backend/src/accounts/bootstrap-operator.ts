import { randomUUID } from 'node:crypto';
import { Inject, Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { sqlStateOf } from '../common/errors/error-body.js';
import { Clock } from '../common/time/clock.js';
import { UnitOfWork } from '../common/unit-of-work/unit-of-work.js';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';
import { InvitationModel } from './invitation.model.js';
import { PersonModel } from './person.model.js';
import { Links } from './tokens/links.service.js';

/** The link is good for a day; the next start prints another while nobody took it. */
const validMinutes = 24 * 60;
/** SQLSTATE of a table that is not there: the schema is still to be migrated. */
const undefinedTable = '42P01';

/**
 * A new installation has nobody who could invite anybody. So while there is no operator the server prints, at its start, a link that makes
 * one of whoever opens it. It goes to the terminal, not to the log.
 */
@Injectable()
export class BootstrapOperator implements OnApplicationBootstrap {
  constructor(
    @InjectConnection() private readonly sequelize: Sequelize,
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    @InjectModel(InvitationModel) private readonly invitations: typeof InvitationModel,
    private readonly links: Links,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    @Inject(ENVIRONMENT) private readonly environment: Environment,
  ) {}

  async onApplicationBootstrap(): Promise<void> {
    if (this.environment.HOLDWATER_MODE !== 'production' || this.environment.ROLE === 'worker') return;
    try {
      const link = await this.inviteFirst();
      if (link !== null)
        console.log(
          `Nobody operates Holdwater yet. This link, good once and until tomorrow, makes the first operator:\n${link}`,
        );
    } catch (error) {
      if (sqlStateOf(error) !== undefinedTable) throw error;
    }
  }

  /** The address of a new invitation, or null where there is an operator. Those printed before are void. */
  async inviteFirst(): Promise<string | null> {
    return this.unitOfWork.run(async () => {
      // servers that start at once print one good link, not several
      await this.sequelize.query("SELECT pg_advisory_xact_lock(hashtextextended('first operator', 0))", {
        type: QueryTypes.SELECT,
      });
      if ((await this.persons.count({ where: { isOperator: true } })) > 0) return null;
      const token = await this.links.issue(
        'invitation',
        { invitationId: await this.replaceInvitation() },
        validMinutes,
      );
      return `${this.environment.APP_URL.replace(/\/$/, '')}/link/invitation#token=${token}`;
    });
  }

  private async replaceInvitation(): Promise<string> {
    const now = this.clock.now();
    await this.invitations.update(
      { withdrawnAt: now },
      { where: { isOperator: true, acceptedAt: null, withdrawnAt: null } },
    );
    const invitation = await this.invitations.create({
      id: randomUUID(),
      organizationId: null,
      // whoever accepts says who they are
      email: '',
      name: '',
      roles: [],
      isOperator: true,
      createdAt: now,
      expiresAt: new Date(now.getTime() + validMinutes * 60_000),
    });
    return invitation.id;
  }
}
