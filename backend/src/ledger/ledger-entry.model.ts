import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** One entry of a chain; append-only in the database itself. */
@Table({ tableName: 'ledger_entries', timestamps: false, underscored: true })
export class LedgerEntryModel extends Model {
  @PrimaryKey
  @Column(DataType.TEXT)
  declare scope: string;

  @PrimaryKey
  @Column(DataType.INTEGER)
  declare sequence: number;

  @Column(DataType.UUID)
  declare lotId: string | null;

  @Column(DataType.DATE)
  declare at: Date;

  @Column(DataType.TEXT)
  declare kind: string;

  @Column(DataType.UUID)
  declare actorId: string | null;

  @Column(DataType.TEXT)
  declare actorRole: string | null;

  @Column(DataType.JSONB)
  declare payload: Record<string, unknown>;

  @Column(DataType.TEXT)
  declare previousHash: string;

  @Column(DataType.TEXT)
  declare hash: string;
}
