import { askSignInLink, signIn, useSignInLink } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { Controller, Req, Res } from '@nestjs/common';
import type { Request, Response } from 'express';
import { anyone } from '../../common/access/access.js';
import { Input } from '../../common/contract/contract-input.js';
import { ContractRoute } from '../../common/contract/contract-route.js';
import { RefreshCookie } from '../sessions/refresh-cookie.js';
import { Attempts } from './attempts.js';
import { MailedLinks } from './mailed-links.service.js';
import { SignIn } from './sign-in.service.js';

@Controller()
export class SignInController {
  constructor(
    private readonly signingIn: SignIn,
    private readonly mailed: MailedLinks,
    private readonly attempts: Attempts,
    private readonly cookie: RefreshCookie,
  ) {}

  @ContractRoute(signIn, anyone)
  async byPassword(
    @Input() { body }: RouteInput<typeof signIn>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ) {
    return this.cookie.give(
      response,
      await this.signingIn.byPassword(body.email, body.password, this.attempts.of(request)),
    );
  }

  @ContractRoute(askSignInLink, anyone)
  async askLink(@Input() { body }: RouteInput<typeof askSignInLink>) {
    await this.mailed.ask('sign-in', body.email);
    return { done: true as const };
  }

  @ContractRoute(useSignInLink, anyone)
  async byLink(
    @Input() { body }: RouteInput<typeof useSignInLink>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ) {
    return this.cookie.give(response, await this.signingIn.byLink(body.token, this.attempts.of(request)));
  }
}
