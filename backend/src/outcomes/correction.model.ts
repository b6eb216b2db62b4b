import type {
  CorrectionState,
  CorrectionSubject,
  Severity,
} from '@holdwater/shared-types/outcomes/correction.states.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One thing to put right, until the inspector accepts it. */
@Table({ tableName: 'corrections', timestamps: false, underscored: true })
export class CorrectionModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare clientId: string;

  @Column(DataType.UUID)
  declare lotId: string;

  @Column(DataType.UUID)
  declare visitId: string;

  @Column(DataType.INTEGER)
  declare unitNumber: number;

  @Column(DataType.TEXT)
  declare stageCode: string;

  @Column(DataType.INTEGER)
  declare number: number;

  @Column(DataType.TEXT)
  declare subject: CorrectionSubject;

  @Column(DataType.TEXT)
  declare pointCode: string | null;

  @Column(DataType.TEXT)
  declare text: string;

  @Column(DataType.JSONB)
  declare place: { x: number; y: number } | 'whole-system';

  @Column(DataType.TEXT)
  declare floor: string | null;

  @Column(DataType.TEXT)
  declare room: string | null;

  @Column(DataType.TEXT)
  declare severity: Severity;

  @Column(DataType.TEXT)
  declare section: string | null;

  @Column(DataType.TEXT)
  declare state: CorrectionState;

  @Column(DataType.INTEGER)
  declare version: number;

  @Column(DataType.DATE)
  declare openedAt: Date;

  @Column(DataType.UUID)
  declare openedBy: string;

  @Column(DataType.DATE)
  declare fixedAt: Date | null;

  @Column(DataType.UUID)
  declare fixedBy: string | null;

  @Column(DataType.TEXT)
  declare fixNote: string | null;

  @Column(DataType.TEXT)
  declare reopenedWhy: string | null;

  @Column(DataType.DATE)
  declare acceptedAt: Date | null;

  @Column(DataType.UUID)
  declare acceptedBy: string | null;
}
