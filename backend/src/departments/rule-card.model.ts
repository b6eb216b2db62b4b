import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { DateRange } from '../common/time/ranges.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One version of what a department requires. A published one is never edited. `effective` is written and read by raw queries. */
@Table({ tableName: 'rule_cards', timestamps: false, underscored: true })
export class RuleCardModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare departmentId: string;

  @Column(DataType.INTEGER)
  declare version: number;

  @Column(DataType.TEXT)
  declare state: 'draft' | 'published';

  @Column(DataType.JSONB)
  declare content: RuleCardContent;

  @Column(DataType.RANGE(DataType.DATEONLY))
  declare effective: DateRange | null;

  @Column(DataType.UUID)
  declare createdBy: string | null;

  @Column(DataType.DATE)
  declare createdAt: Date;

  @Column(DataType.UUID)
  declare editedBy: string | null;

  @Column(DataType.DATE)
  declare editedAt: Date | null;

  @Column(DataType.UUID)
  declare publishedBy: string | null;

  @Column(DataType.DATE)
  declare publishedAt: Date | null;
}
