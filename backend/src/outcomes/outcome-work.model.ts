import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** Whether a point of the work was looked at. */
@Table({ tableName: 'outcome_work', timestamps: false, underscored: true })
export class OutcomeWorkModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare outcomeId: string;

  @Column(DataType.TEXT)
  declare pointCode: string;

  @Column(DataType.BOOLEAN)
  declare isLookedAt: boolean;
}
