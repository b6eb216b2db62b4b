import { acceptInvitation, readInvitation } from '@holdwater/shared-types/accounts/auth.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { Controller, Req, Res } from '@nestjs/common';
import type { Request, Response } from 'express';
import { anyone } from '../../common/access/access.js';
import { Input } from '../../common/contract/contract-input.js';
import { ContractRoute } from '../../common/contract/contract-route.js';
import { RefreshCookie } from '../sessions/refresh-cookie.js';
import { Attempts } from '../sign-in/attempts.js';
import { AcceptInvitation } from './accept-invitation.service.js';

/** What whoever holds an invitation's link may do. */
@Controller()
export class InvitationsController {
  constructor(
    private readonly accepting: AcceptInvitation,
    private readonly attempts: Attempts,
    private readonly cookie: RefreshCookie,
  ) {}

  @ContractRoute(readInvitation, anyone)
  read(@Input() { body }: RouteInput<typeof readInvitation>) {
    return this.accepting.read(body.token);
  }

  @ContractRoute(acceptInvitation, anyone)
  async accept(
    @Input() { body }: RouteInput<typeof acceptInvitation>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ) {
    return this.cookie.give(response, await this.accepting.accept(body, this.attempts.of(request)));
  }
}
