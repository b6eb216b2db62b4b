import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Changes } from '../../common/changes/changes.js';
import { Clock } from '../../common/time/clock.js';
import { Ledger } from '../../ledger/ledger.service.js';
import type { InvitationModel } from '../invitation.model.js';
import { MembershipModel } from '../membership.model.js';
import { PersonModel } from '../person.model.js';

/** Gives a person what an invitation promised; inside the unit of work of its acceptance. */
@Injectable()
export class Joining {
  constructor(
    @InjectModel(MembershipModel) private readonly memberships: typeof MembershipModel,
    @InjectModel(PersonModel) private readonly persons: typeof PersonModel,
    private readonly ledger: Ledger,
    private readonly clock: Clock,
    private readonly changes: Changes,
  ) {}

  async join(personId: string, { organizationId, roles }: InvitationModel): Promise<void> {
    if (organizationId === null) return this.becomeOperator(personId);
    await this.memberships.create({
      id: randomUUID(),
      personId,
      organizationId,
      roles,
      isDisabled: false,
      createdAt: this.clock.now(),
    });
    this.changes.access({ personId });
    await this.ledger.appendTo(
      `organization:${organizationId}`,
      'person-joined',
      { personId, roles: [...roles] },
      { personId, role: null },
    );
  }

  private async becomeOperator(personId: string): Promise<void> {
    await this.persons.update({ isOperator: true }, { where: { id: personId } });
    await this.ledger.appendTo('installation', 'operator-joined', { personId }, { personId, role: null });
  }
}
