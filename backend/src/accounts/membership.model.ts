import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** A person in an organization, with roles. */
@Table({ tableName: 'memberships', timestamps: false, underscored: true })
export class MembershipModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare personId: string;

  @Column(DataType.UUID)
  declare organizationId: string;

  @Column(DataType.ARRAY(DataType.TEXT))
  declare roles: MemberRole[];

  @Column(DataType.BOOLEAN)
  declare isDisabled: boolean;

  @Column(DataType.DATE)
  declare createdAt: Date;
}
