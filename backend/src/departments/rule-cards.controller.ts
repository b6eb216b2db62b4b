import { Controller } from '@nestjs/common';
import {
  deleteRuleCardDraft,
  draftRuleCard,
  editRuleCard,
  publishRuleCard,
  readPublicRuleCard,
  readRuleCard,
  readRuleCardTouches,
} from '@holdwater/shared-types/departments/departments.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { anyone, signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { PublishRuleCardService } from './publish-rule-card.service.js';
import { ReadDepartmentsService } from './read-departments.service.js';
import { RuleCardDraftsService } from './rule-card-drafts.service.js';
import { RuleCardTouchesService } from './rule-card-touches.service.js';

@Controller()
export class RuleCardsController {
  constructor(
    private readonly reading: ReadDepartmentsService,
    private readonly drafts: RuleCardDraftsService,
    private readonly publishing: PublishRuleCardService,
    private readonly touches: RuleCardTouchesService,
  ) {}

  @ContractRoute(readRuleCard, signedIn('departments.canReadDraft'))
  async read(@Input() { params }: RouteInput<typeof readRuleCard>, @CurrentActor() actor: Actor) {
    return this.reading.readRuleCard(actor, params.ruleCardId);
  }

  @ContractRoute(readPublicRuleCard, anyone)
  async readPublic(@Input() { params }: RouteInput<typeof readPublicRuleCard>) {
    return this.reading.readRuleCard(null, params.ruleCardId);
  }

  @ContractRoute(draftRuleCard, signedIn('departments.canEditRuleCards'))
  async draft(@Input() { params }: RouteInput<typeof draftRuleCard>, @CurrentActor() actor: Actor) {
    return this.drafts.draft(actor, params.departmentId);
  }

  @ContractRoute(editRuleCard, signedIn('departments.canEditRuleCards'))
  async edit(@Input() { params, body }: RouteInput<typeof editRuleCard>, @CurrentActor() actor: Actor) {
    return this.drafts.edit(actor, params.ruleCardId, body.content);
  }

  @ContractRoute(deleteRuleCardDraft, signedIn('departments.canEditRuleCards'))
  async remove(@Input() { params }: RouteInput<typeof deleteRuleCardDraft>, @CurrentActor() actor: Actor) {
    await this.drafts.remove(actor, params.ruleCardId);
    return { done: true };
  }

  @ContractRoute(readRuleCardTouches, signedIn('departments.canReadDraft'))
  async readTouches(@Input() { params }: RouteInput<typeof readRuleCardTouches>, @CurrentActor() actor: Actor) {
    return this.touches.read(actor, params.ruleCardId);
  }

  @ContractRoute(publishRuleCard, signedIn('departments.canEditRuleCards'))
  async publish(@Input() { params, body }: RouteInput<typeof publishRuleCard>, @CurrentActor() actor: Actor) {
    return this.publishing.publish(actor, params.ruleCardId, body.effectiveFrom);
  }
}
