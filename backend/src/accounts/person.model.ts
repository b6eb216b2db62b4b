import type { Locale } from '@holdwater/shared-types/common/locale.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A person; what they may do hangs on their memberships. */
@Table({ tableName: 'persons', timestamps: false, underscored: true })
export class PersonModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.TEXT)
  declare email: string;

  @Column(DataType.TEXT)
  declare name: string;

  @Column(DataType.TEXT)
  declare phone: string | null;

  @Column(DataType.TEXT)
  declare passwordHash: string | null;

  @Column(DataType.TEXT)
  declare locale: Locale;

  @Column(DataType.TEXT)
  declare units: 'us' | 'metric';

  @Column(DataType.BOOLEAN)
  declare isOperator: boolean;

  @Column(DataType.BOOLEAN)
  declare isDisabled: boolean;

  @Column(DataType.DATE)
  declare createdAt: Date;
}
