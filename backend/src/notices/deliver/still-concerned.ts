import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

/** Asked again when a mail is sent: whoever was disabled since gets nothing more. Account mail has no person and is always sent. */
@Injectable()
export class StillConcerned {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  async is(personId: string | null): Promise<boolean> {
    if (personId === null) return true;
    const found = await this.sequelize.query(
      `SELECT 1 FROM persons p WHERE p.id = :personId AND NOT p.is_disabled
         AND EXISTS (SELECT 1 FROM memberships m WHERE m.person_id = p.id AND NOT m.is_disabled)`,
      { replacements: { personId }, type: QueryTypes.SELECT },
    );
    return found.length > 0;
  }
}
