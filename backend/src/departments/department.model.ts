import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** What an organization of kind department has besides: its zone and elevation. Shares the id of its organization. */
@Table({ tableName: 'departments', timestamps: false, underscored: true })
export class DepartmentModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.TEXT)
  declare zone: string;

  @Column(DataType.DOUBLE)
  declare elevationFt: number;

  @Column(DataType.BOOLEAN)
  declare isOutside: boolean;
}
