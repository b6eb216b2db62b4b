import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';

/**
 * Asked again when a mail is sent: whoever was disabled since gets nothing more, and nothing of a lot whose parties are others by now.
 * Account mail has no person and is always sent.
 */
@Injectable()
export class StillConcerned {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** `lotId` null: the mail is of no lot. */
  async is(personId: string | null, lotId: string | null): Promise<boolean> {
    if (personId === null) return true;
    const found = await this.sequelize.query(
      `SELECT 1 FROM persons p JOIN memberships m ON m.person_id = p.id
       WHERE p.id = :personId AND NOT p.is_disabled AND NOT m.is_disabled ${lotId === null ? '' : `AND ${isOfLot}`} LIMIT 1`,
      { replacements: { personId, lotId }, type: QueryTypes.SELECT },
    );
    return found.length > 0;
  }
}

/** A party of the lot, asked to be one, or of a department that comes or came. */
const isOfLot = `(EXISTS (SELECT 1 FROM lots l WHERE l.id = :lotId AND m.organization_id IN (l.builder_id, l.plumber_id, l.department_id))
  OR EXISTS (SELECT 1 FROM lot_consents c WHERE c.lot_id = :lotId AND c.organization_id = m.organization_id AND c.answered_at IS NULL)
  OR EXISTS (SELECT 1 FROM visits v WHERE v.lot_id = :lotId AND v.department_id = m.organization_id))`;
