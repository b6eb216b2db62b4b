import type { VisitState } from '@holdwater/shared-types/visits/visit.states.js';
import type { InstantRange } from '../common/time/ranges.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One inspector at one lot in one window, for one stage. */
@Table({ tableName: 'visits', timestamps: false, underscored: true })
export class VisitModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare lotId: string;

  @Column(DataType.UUID)
  declare departmentId: string;

  @Column(DataType.UUID)
  declare ruleCardId: string;

  @Column(DataType.TEXT)
  declare stageCode: string;

  @Column(DataType.ARRAY(DataType.INTEGER))
  declare unitNumbers: number[];

  @Column(DataType.TEXT)
  declare state: VisitState;

  @Column(DataType.INTEGER)
  declare version: number;

  @Column(DataType.DATEONLY)
  declare windowDate: string;

  @Column(DataType.TEXT)
  declare windowLabel: string;

  @Column(DataType.RANGE(DataType.DATE))
  declare window: InstantRange;

  @Column(DataType.INTEGER)
  declare place: number | null;

  @Column(DataType.UUID)
  declare inspectorId: string | null;

  @Column(DataType.RANGE(DataType.DATE))
  declare planned: InstantRange | null;

  @Column(DataType.UUID)
  declare requestedBy: string;

  @Column(DataType.TEXT)
  declare requestingSide: 'builder' | 'plumber' | 'desk';

  @Column(DataType.TEXT)
  declare callerName: string | null;

  @Column(DataType.DATE)
  declare requestedAt: Date;

  @Column(DataType.DATE)
  declare neededBy: Date | null;

  @Column(DataType.TEXT)
  declare note: string | null;

  @Column(DataType.BOOLEAN)
  declare hasFirstPlace: boolean;

  @Column(DataType.BOOLEAN)
  declare isRetest: boolean;

  @Column(DataType.DATE)
  declare readyAt: Date | null;

  @Column(DataType.DATE)
  declare begunAt: Date | null;

  @Column(DataType.UUID)
  declare begunBy: string | null;

  @Column(DataType.TEXT)
  declare begunFrom: 'booked' | 'ready' | null;

  @Column(DataType.DATE)
  declare endedAt: Date | null;

  @Column(DataType.TEXT)
  declare endReason: string | null;

  @Column(DataType.TEXT)
  declare endNote: string | null;

  @Column(DataType.UUID)
  declare calendarUid: string;

  @Column(DataType.INTEGER)
  declare calendarSequence: number;

  /** The visit its deadline had freed, in whose stead this one stands. */
  @Column(DataType.UUID)
  declare restoresId: string | null;

  @Column(DataType.DATE)
  declare createdAt: Date;
}
