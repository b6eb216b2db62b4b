import { askPasswordReset, changePassword, resetPassword } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { Controller, Req, Res } from '@nestjs/common';
import type { Request, Response } from 'express';
import { anyone, signedIn } from '../../common/access/access.js';
import type { Actor } from '../../common/access/actor.js';
import { CurrentActor } from '../../common/access/current-actor.js';
import { Input } from '../../common/contract/contract-input.js';
import { ContractRoute } from '../../common/contract/contract-route.js';
import { currentRequest } from '../../common/request/request-context.js';
import { RefreshCookie } from '../sessions/refresh-cookie.js';
import { Attempts } from '../sign-in/attempts.js';
import { MailedLinks } from '../sign-in/mailed-links.service.js';
import { NewPassword } from './new-password.service.js';

@Controller()
export class PasswordsController {
  constructor(
    private readonly newPassword: NewPassword,
    private readonly mailed: MailedLinks,
    private readonly attempts: Attempts,
    private readonly cookie: RefreshCookie,
  ) {}

  @ContractRoute(askPasswordReset, anyone)
  async askReset(@Input() { body }: RouteInput<typeof askPasswordReset>) {
    await this.mailed.ask('reset', body.email);
    return { done: true as const };
  }

  @ContractRoute(resetPassword, anyone)
  async reset(
    @Input() { body }: RouteInput<typeof resetPassword>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ) {
    return this.cookie.give(
      response,
      await this.newPassword.reset(body.token, body.password, this.attempts.of(request)),
    );
  }

  @ContractRoute(changePassword, signedIn('own'))
  async change(
    @Input() { body }: RouteInput<typeof changePassword>,
    @CurrentActor() actor: Actor,
    @Req() request: Request,
  ) {
    forgetBody();
    await this.newPassword.change(actor, body.currentPassword, body.password, this.attempts.of(request).address);
    return { done: true as const };
  }
}

/** The key of a repeated request is stored with a quick hash of its body; a body of passwords must not be kept that way. */
function forgetBody(): void {
  const request = currentRequest();
  if (request) request.idempotency = null;
}
