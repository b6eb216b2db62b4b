import { Module } from '@nestjs/common';
import { JwtModule } from '@nestjs/jwt';
import { PassportModule } from '@nestjs/passport';
import { SequelizeModule } from '@nestjs/sequelize';
import type { Environment } from '../config/environment.js';
import { ENVIRONMENT } from '../config/environment.module.js';
import { AccountsQueries } from './accounts.queries.js';
import { InvitationModel } from './invitation.model.js';
import { LinkTokenModel } from './link-token.model.js';
import { MembershipModel } from './membership.model.js';
import { OrganizationModel } from './organization.model.js';
import { PersonModel } from './person.model.js';
import { RefreshTokenModel } from './refresh-token.model.js';
import { SessionModel } from './session.model.js';
import { Authentication } from './sessions/authentication.service.js';
import { JwtStrategy } from './sessions/jwt.strategy.js';
import { AccessTokens } from './tokens/access-tokens.js';

const models = [InvitationModel, LinkTokenModel, MembershipModel, OrganizationModel, PersonModel, RefreshTokenModel, SessionModel];

/** People, organizations, sessions and invitations. */
@Module({
  imports: [
    PassportModule,
    JwtModule.registerAsync({ inject: [ENVIRONMENT], useFactory: (environment: Environment) => ({ secret: environment.JWT_SECRET }) }),
    SequelizeModule.forFeature(models),
  ],
  providers: [AccessTokens, AccountsQueries, Authentication, JwtStrategy],
  exports: [AccessTokens, AccountsQueries, Authentication],
})
export class AccountsModule {}
