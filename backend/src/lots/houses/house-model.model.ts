import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A house a builder saved under a name; its geometry stands in its versions. */
@Table({ tableName: 'house_models', timestamps: false, underscored: true })
export class HouseModelModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare builderId: string;

  @Column(DataType.TEXT)
  declare name: string;

  /** The newest version. */
  @Column({ type: DataType.INTEGER, field: 'version' })
  declare newestVersion: number;

  @Column(DataType.DATE)
  declare createdAt: Date;
}
