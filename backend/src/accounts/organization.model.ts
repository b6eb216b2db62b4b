import type { OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A builder, a plumbing contractor or a department. */
@Table({ tableName: 'organizations', timestamps: false, underscored: true })
export class OrganizationModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.TEXT)
  declare name: string;

  @Column(DataType.TEXT)
  declare kind: OrganizationKind;

  @Column(DataType.TEXT)
  declare phone: string | null;

  @Column(DataType.DATE)
  declare createdAt: Date;
}
