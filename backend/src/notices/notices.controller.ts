import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { listNotices, markNoticesRead } from '@holdwater/shared-types/notices/notice.contract.js';
import { signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { Notices } from './notices.service.js';

@Controller()
export class NoticesController {
  constructor(private readonly notices: Notices) {}

  @ContractRoute(listNotices, signedIn('own'))
  list(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof listNotices>) {
    return this.notices.list(actor, input.query);
  }

  @ContractRoute(markNoticesRead, signedIn('own'))
  markRead(@CurrentActor() actor: Actor, @Input() input: RouteInput<typeof markNoticesRead>) {
    return this.notices.markRead(actor, input.body.ids);
  }
}
