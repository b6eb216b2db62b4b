import type { GaugeValve } from '@holdwater/shared-types/holds/hold.states.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One reading as typed; never edited, only struck. */
@Table({ tableName: 'readings', timestamps: false, underscored: true })
export class ReadingModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare clientId: string;

  @Column(DataType.UUID)
  declare holdId: string;

  @Column(DataType.DATE)
  declare madeAt: Date;

  @Column(DataType.DATE)
  declare receivedAt: Date;

  @Column(DataType.DOUBLE)
  declare pressurePsi: number | null;

  @Column(DataType.DOUBLE)
  declare levelIn: number | null;

  @Column(DataType.DOUBLE)
  declare temperatureF: number | null;

  @Column(DataType.TEXT)
  declare gaugeValve: GaugeValve | null;

  @Column(DataType.TEXT)
  declare note: string | null;

  @Column(DataType.UUID)
  declare byPerson: string;

  @Column(DataType.TEXT)
  declare byRole: 'plumber' | 'helper' | 'superintendent' | 'inspector';

  @Column(DataType.DATE)
  declare struckAt: Date | null;

  @Column(DataType.UUID)
  declare struckBy: string | null;

  @Column(DataType.TEXT)
  declare struckWhy: string | null;
}
