import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A day, or a span of one, on which the department does not come. */
@Table({ tableName: 'department_closures', timestamps: false, underscored: true })
export class ClosureModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare departmentId: string;

  @Column(DataType.DATEONLY)
  declare date: string;

  @Column(DataType.TIME)
  declare fromTime: string | null;

  @Column(DataType.TIME)
  declare toTime: string | null;

  @Column(DataType.TEXT)
  declare why: string;

  @Column(DataType.UUID)
  declare createdBy: string | null;

  @Column(DataType.DATE)
  declare createdAt: Date;

  @Column(DataType.DATE)
  declare removedAt: Date | null;
}
