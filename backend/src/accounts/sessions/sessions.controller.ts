import { refreshSession, signOut, signOutEverywhere } from '@holdwater/shared-types/accounts/auth.contract.js';
import { Controller, Inject, Req, Res } from '@nestjs/common';
import type { Request, Response } from 'express';
import { anyone, signedIn } from '../../common/access/access.js';
import type { Actor } from '../../common/access/actor.js';
import { CurrentActor } from '../../common/access/current-actor.js';
import { ContractRoute } from '../../common/contract/contract-route.js';
import { AppError } from '../../common/errors/app-error.js';
import type { Environment } from '../../config/environment.js';
import { ENVIRONMENT } from '../../config/environment.module.js';
import { refuseOtherPages } from './own-page.js';
import { RefreshCookie } from './refresh-cookie.js';
import { RefreshSession } from './refresh.service.js';
import { SignOut } from './sign-out.service.js';

@Controller()
export class SessionsController {
  constructor(
    private readonly refreshing: RefreshSession,
    private readonly signingOut: SignOut,
    private readonly cookie: RefreshCookie,
    @Inject(ENVIRONMENT) private readonly environment: Environment,
  ) {}

  /** Reached by the cookie alone: the page has no access token when it opens. */
  @ContractRoute(refreshSession, anyone)
  async refresh(@Req() request: Request, @Res({ passthrough: true }) response: Response) {
    refuseOtherPages(request, this.environment.APP_URL);
    try {
      return this.cookie.give(response, await this.refreshing.refresh(this.cookie.find(request)));
    } catch (error) {
      if (error instanceof AppError) this.cookie.clear(response);
      throw error;
    }
  }

  /** Works without an access token too: whoever asks to be signed out is. */
  @ContractRoute(signOut, anyone)
  async signOut(@Req() request: Request, @Res({ passthrough: true }) response: Response) {
    refuseOtherPages(request, this.environment.APP_URL);
    await this.signingOut.one(this.cookie.find(request), bearerOf(request));
    this.cookie.clear(response);
    return { done: true as const };
  }

  @ContractRoute(signOutEverywhere, signedIn('own'))
  async signOutEverywhere(@CurrentActor() actor: Actor, @Res({ passthrough: true }) response: Response) {
    await this.signingOut.everywhere(actor);
    this.cookie.clear(response);
    return { done: true as const };
  }
}

function bearerOf(request: Request): string | null {
  return /^Bearer (\S+)$/i.exec(request.get('authorization') ?? '')?.[1] ?? null;
}
