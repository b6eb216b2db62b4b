import { Injectable } from '@nestjs/common';
import type { Actor } from '../../common/access/actor.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { AccessTokens } from '../tokens/access-tokens.js';
import { Sessions } from './sessions.service.js';

@Injectable()
export class SignOut {
  constructor(
    private readonly sessions: Sessions,
    private readonly accessTokens: AccessTokens,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** Ends the session of the cookie, and that of the access token where it is another. */
  async one(refreshToken: string | null, accessToken: string | null): Promise<void> {
    await this.unitOfWork.run(async () => {
      await this.sessions.endByRefreshToken(refreshToken, 'signed-out');
      const claims = accessToken === null ? null : this.accessTokens.find(accessToken);
      if (claims) await this.sessions.end(claims.sessionId, 'signed-out');
    });
  }

  async everywhere(actor: Actor): Promise<void> {
    await this.unitOfWork.run(() => this.sessions.endAllOf(actor.personId, 'signed-out-everywhere'));
  }
}
