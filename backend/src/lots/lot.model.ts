import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A lot: one house, the builder whose it is, and the plumber and department that consented to it. */
@Table({ tableName: 'lots', timestamps: false, underscored: true })
export class LotModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare builderId: string;

  @Column(DataType.UUID)
  declare plumberId: string | null;

  @Column(DataType.UUID)
  declare departmentId: string | null;

  @Column(DataType.UUID)
  declare tractId: string | null;

  @Column(DataType.TEXT)
  declare number: string;

  @Column(DataType.TEXT)
  declare address: string;

  @Column(DataType.DOUBLE)
  declare latitude: number | null;

  @Column(DataType.DOUBLE)
  declare longitude: number | null;

  @Column(DataType.TEXT)
  declare permitNumber: string | null;

  @Column(DataType.TEXT)
  declare permitStatus: 'not-applied' | 'applied' | 'issued' | 'expired';

  @Column(DataType.TEXT)
  declare permitHolder: string | null;

  @Column(DataType.BOOLEAN)
  declare mayPlumberRequest: boolean;

  @Column(DataType.DATEONLY)
  declare coverDate: string | null;

  @Column(DataType.TEXT)
  declare gateCode: string | null;

  @Column(DataType.TEXT)
  declare contactName: string | null;

  @Column(DataType.TEXT)
  declare contactPhone: string | null;

  @Column(DataType.TEXT)
  declare hazards: string | null;

  @Column(DataType.DATE)
  declare createdAt: Date;
}
