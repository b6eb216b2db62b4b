import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** The plumber’s statement that the tests stand for a booked window, with the readings it rests on. */
@Table({ tableName: 'test_ups', timestamps: false, underscored: true })
export class TestUpModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare clientId: string;

  @Column(DataType.UUID)
  declare visitId: string;

  @Column(DataType.UUID)
  declare saidBy: string;

  @Column(DataType.DATE)
  declare saidAt: Date;

  @Column(DataType.DATE)
  declare receivedAt: Date;

  @Column(DataType.ARRAY(DataType.UUID))
  declare readingIds: string[];

  @Column(DataType.DATE)
  declare endedAt: Date | null;

  @Column(DataType.UUID)
  declare endedBy: string | null;

  @Column(DataType.TEXT)
  declare endNote: string | null;
}
