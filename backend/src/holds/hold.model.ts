import type { HoldEndReason, HoldState, Medium, Method, System } from '@holdwater/shared-types/holds/hold.states.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One test left standing, started, read, ended. */
@Table({ tableName: 'holds', timestamps: false, underscored: true })
export class HoldModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare clientId: string;

  @Column(DataType.UUID)
  declare lotId: string;

  @Column(DataType.INTEGER)
  declare unitNumber: number;

  @Column(DataType.TEXT)
  declare stageCode: string;

  @Column(DataType.TEXT)
  declare system: System;

  @Column(DataType.INTEGER)
  declare ordinal: number;

  @Column(DataType.UUID)
  declare planId: string | null;

  @Column(DataType.UUID)
  declare plumberId: string;

  @Column(DataType.TEXT)
  declare method: Method;

  @Column(DataType.TEXT)
  declare medium: Medium;

  @Column(DataType.JSONB)
  declare gauge: { rangePsi: number; incrementPsi: number } | null;

  @Column(DataType.JSONB)
  declare tape: { incrementIn: number } | null;

  @Column(DataType.DOUBLE)
  declare fillLevelFt: number | null;

  @Column(DataType.DOUBLE)
  declare minimumPsi: number | null;

  @Column(DataType.DOUBLE)
  declare ceilingPsi: number | null;

  @Column(DataType.INTEGER)
  declare settleMinutes: number;

  @Column(DataType.TEXT)
  declare state: HoldState;

  @Column(DataType.UUID)
  declare supersedesId: string | null;

  @Column(DataType.UUID)
  declare startedBy: string;

  @Column(DataType.DATE)
  declare startedAt: Date;

  @Column(DataType.DATE)
  declare receivedAt: Date;

  @Column(DataType.UUID)
  declare endedBy: string | null;

  @Column(DataType.DATE)
  declare endedAt: Date | null;

  @Column(DataType.TEXT)
  declare endReason: HoldEndReason | null;

  @Column(DataType.TEXT)
  declare endNote: string | null;
}
