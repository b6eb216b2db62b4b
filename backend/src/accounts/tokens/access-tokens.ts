import { Injectable } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import { z } from 'zod';
import { Clock } from '../../common/time/clock.js';

/** What a good access token is; everything else is refused. */
export const accessTokenRules = {
  algorithm: 'HS256',
  issuer: 'holdwater',
  audience: 'holdwater-api',
  minutes: 10,
} as const;

const claims = z.object({ sub: z.uuid(), sid: z.uuid(), iat: z.number(), exp: z.number() });

/** Whose token it is, of which session. */
export interface AccessClaims {
  personId: string;
  sessionId: string;
}

/** Issues and reads the short-lived tokens that every request carries. Their time is the server's clock. */
@Injectable()
export class AccessTokens {
  constructor(
    private readonly jwt: JwtService,
    private readonly clock: Clock,
  ) {}

  issue(personId: string, sessionId: string): { accessToken: string; expiresAt: Date } {
    const issuedAt = this.seconds();
    const exp = issuedAt + accessTokenRules.minutes * 60;
    const { algorithm, issuer, audience } = accessTokenRules;
    const accessToken = this.jwt.sign(
      { sub: personId, sid: sessionId, iat: issuedAt, exp },
      { algorithm, issuer, audience },
    );
    return { accessToken, expiresAt: new Date(exp * 1000) };
  }

  /** What a token says, or null when it is not one of ours or is over. */
  find(token: string): AccessClaims | null {
    const { algorithm, issuer, audience } = accessTokenRules;
    try {
      return this.findClaims(
        this.jwt.verify<object>(token, { algorithms: [algorithm], issuer, audience, ignoreExpiration: true }),
      );
    } catch {
      // a token that cannot be read is no token
      return null;
    }
  }

  /** What a payload says whose signature, issuer and audience are proven; null when it is over or not whole. */
  findClaims(payload: unknown): AccessClaims | null {
    const parsed = claims.safeParse(payload);
    if (!parsed.success || parsed.data.exp <= this.seconds()) return null;
    return { personId: parsed.data.sub, sessionId: parsed.data.sid };
  }

  private seconds(): number {
    return Math.floor(this.clock.now().getTime() / 1000);
  }
}
