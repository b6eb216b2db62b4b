import type { MemberRole } from '@holdwater/shared-types/accounts/roles.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** An invitation of a person into an organization, or of the first operator. */
@Table({ tableName: 'invitations', timestamps: false, underscored: true })
export class InvitationModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare organizationId: string | null;

  @Column(DataType.TEXT)
  declare email: string;

  @Column(DataType.TEXT)
  declare name: string;

  @Column(DataType.ARRAY(DataType.TEXT))
  declare roles: MemberRole[];

  @Column(DataType.BOOLEAN)
  declare isOperator: boolean;

  @Column(DataType.UUID)
  declare invitedBy: string | null;

  @Column(DataType.DATE)
  declare createdAt: Date;

  @Column(DataType.DATE)
  declare expiresAt: Date;

  @Column(DataType.DATE)
  declare acceptedAt: Date | null;

  @Column(DataType.DATE)
  declare withdrawnAt: Date | null;
}
