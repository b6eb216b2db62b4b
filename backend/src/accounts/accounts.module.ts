import { Module } from '@nestjs/common';
import { JwtModule } from '@nestjs/jwt';
import { PassportModule } from '@nestjs/passport';
import { SequelizeModule } from '@nestjs/sequelize';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';
import { DepartmentModel } from '../departments/department.model.js';
import { AccountMail } from './account-mail.service.js';
import { AccountsCleanup } from './accounts-cleanup.js';
import { AccountsQueries } from './accounts.queries.js';
import { BootstrapOperator } from './bootstrap-operator.js';
import { InvitationModel } from './invitation.model.js';
import { AcceptInvitation } from './invitations/accept-invitation.service.js';
import { InvitationsController } from './invitations/invitations.controller.js';
import { Invitations } from './invitations/invitations.service.js';
import { Joining } from './invitations/joining.service.js';
import { LinkTokenModel } from './link-token.model.js';
import { MembershipModel } from './membership.model.js';
import { OrganizationModel } from './organization.model.js';
import { OrganizationsController } from './organizations/organizations.controller.js';
import { Organizations } from './organizations/organizations.service.js';
import { OrganizationPeople } from './organizations/people.service.js';
import { NewPassword } from './passwords/new-password.service.js';
import { PasswordsController } from './passwords/passwords.controller.js';
import { Passwords } from './passwords/passwords.js';
import { MeController } from './people/me.controller.js';
import { MyAccount } from './people/me.service.js';
import { PersonModel } from './person.model.js';
import { RefreshTokenModel } from './refresh-token.model.js';
import { SessionModel } from './session.model.js';
import { Authentication } from './sessions/authentication.service.js';
import { JwtStrategy } from './sessions/jwt.strategy.js';
import { RefreshCookie } from './sessions/refresh-cookie.js';
import { RefreshSession } from './sessions/refresh.service.js';
import { SessionsController } from './sessions/sessions.controller.js';
import { Sessions } from './sessions/sessions.service.js';
import { SignOut } from './sessions/sign-out.service.js';
import { Attempts } from './sign-in/attempts.js';
import { MailedLinks } from './sign-in/mailed-links.service.js';
import { SignInThrottle } from './sign-in/sign-in-throttle.js';
import { SignInController } from './sign-in/sign-in.controller.js';
import { SignIn } from './sign-in/sign-in.service.js';
import { AccessTokens } from './tokens/access-tokens.js';
import { Links } from './tokens/links.service.js';

const models = [
  DepartmentModel,
  InvitationModel,
  LinkTokenModel,
  MembershipModel,
  OrganizationModel,
  PersonModel,
  RefreshTokenModel,
  SessionModel,
];

/** People, organizations, sessions and invitations. */
@Module({
  imports: [
    PassportModule,
    JwtModule.registerAsync({
      inject: [ENVIRONMENT],
      useFactory: (environment: Environment) => ({ secret: environment.JWT_SECRET }),
    }),
    SequelizeModule.forFeature(models),
  ],
  controllers: [
    InvitationsController,
    MeController,
    OrganizationsController,
    PasswordsController,
    SessionsController,
    SignInController,
  ],
  providers: [
    AcceptInvitation,
    AccessTokens,
    AccountMail,
    AccountsCleanup,
    AccountsQueries,
    Attempts,
    Authentication,
    BootstrapOperator,
    Invitations,
    Joining,
    JwtStrategy,
    Links,
    MailedLinks,
    MyAccount,
    NewPassword,
    OrganizationPeople,
    Organizations,
    Passwords,
    RefreshCookie,
    RefreshSession,
    Sessions,
    SignIn,
    SignInThrottle,
    SignOut,
  ],
  exports: [AccessTokens, AccountsQueries, Authentication, Passwords],
})
export class AccountsModule {}
