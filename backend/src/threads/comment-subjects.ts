import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { commentSubjects } from '@holdwater/shared-types/threads/thread.contract.js';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { refuse } from '../common/errors/app-error.js';

type SubjectKind = (typeof commentSubjects)[number];

const existsSql: Record<SubjectKind, string> = {
  visit: 'SELECT 1 FROM visits WHERE id = :id AND lot_id = :lotId',
  correction: 'SELECT 1 FROM corrections WHERE id = :id AND lot_id = :lotId',
  hold: 'SELECT 1 FROM holds WHERE id = :id AND lot_id = :lotId',
};

/** A comment may hang on a visit, a correction or a test of its own lot. */
@Injectable()
export class CommentSubjects {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Throws `not-found` when the lot has no such thing. */
  async check(lotId: string, on: { kind: SubjectKind; id: string }): Promise<void> {
    const found = await this.sequelize.query(existsSql[on.kind], {
      replacements: { id: on.id, lotId },
      type: QueryTypes.SELECT,
    });
    if (found.length === 0) refuse('not-found');
  }
}
