import { Inject, Injectable } from '@nestjs/common';
import { PassportStrategy } from '@nestjs/passport';
import { ExtractJwt, Strategy } from 'passport-jwt';
import type { Actor } from '../../common/access/actor.js';
import type { Environment } from '../../config/environment.js';
import { ENVIRONMENT } from '../../config/environment.module.js';
import { AccessTokens, accessTokenRules } from '../tokens/access-tokens.js';
import { Authentication } from './authentication.service.js';

/** Reads the Bearer token of a request. Its time is checked against the server's clock, in `AccessTokens`. */
@Injectable()
export class JwtStrategy extends PassportStrategy(Strategy, 'jwt') {
  constructor(
    @Inject(ENVIRONMENT) environment: Environment,
    private readonly tokens: AccessTokens,
    private readonly authentication: Authentication,
  ) {
    super({
      jwtFromRequest: ExtractJwt.fromAuthHeaderAsBearerToken(),
      secretOrKey: environment.JWT_SECRET,
      algorithms: [accessTokenRules.algorithm],
      issuer: accessTokenRules.issuer,
      audience: accessTokenRules.audience,
      ignoreExpiration: true,
    });
  }

  async validate(payload: unknown): Promise<Actor | false> {
    const claims = this.tokens.findClaims(payload);
    return (claims && (await this.authentication.findActor(claims))) ?? false;
  }
}
