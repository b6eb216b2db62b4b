import { Inject, Injectable } from '@nestjs/common';
import { parseCookie } from 'cookie';
import type { CookieOptions, Request, Response } from 'express';
import { Clock } from '../../common/time/clock.js';
import type { Environment } from '../../config/environment.js';
import { ENVIRONMENT } from '../../config/environment.module.js';
import type { Session } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { OpenedSession } from './sessions.service.js';

/** The cookie of the refresh token: no script reads it, no other site sends it; over https it is bound to the host. */
@Injectable()
export class RefreshCookie {
  readonly name: string;
  private readonly options: CookieOptions;

  constructor(
    @Inject(ENVIRONMENT) environment: Environment,
    private readonly clock: Clock,
  ) {
    const secure = environment.APP_URL.startsWith('https:');
    this.name = secure ? '__Host-holdwater_refresh' : 'holdwater_refresh';
    this.options = { httpOnly: true, sameSite: 'strict', path: '/', secure };
  }

  find(request: Request): string | null {
    return parseCookie(request.get('cookie') ?? '')[this.name] ?? null;
  }

  /** Sets the cookie of a session and gives what the page is told. */
  give(response: Response, { answer, refreshToken, expiresAt }: OpenedSession): Session {
    response.cookie(this.name, refreshToken, {
      ...this.options,
      maxAge: expiresAt.getTime() - this.clock.now().getTime(),
    });
    return answer;
  }

  clear(response: Response): void {
    response.clearCookie(this.name, this.options);
  }
}
