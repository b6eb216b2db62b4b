import { InvitationModel } from '../accounts/invitation.model.js';
import { LinkTokenModel } from '../accounts/link-token.model.js';
import { MembershipModel } from '../accounts/membership.model.js';
import { OrganizationModel } from '../accounts/organization.model.js';
import { PersonModel } from '../accounts/person.model.js';
import { RefreshTokenModel } from '../accounts/refresh-token.model.js';
import { SessionModel } from '../accounts/session.model.js';
import { ClearanceModel } from '../clearances/clearance.model.js';
import { ClosureModel } from '../departments/closure.model.js';
import { DepartmentModel } from '../departments/department.model.js';
import { RuleCardModel } from '../departments/rule-card.model.js';
import { PastPartyModel } from '../handovers/past-party.model.js';
import { HoldModel } from '../holds/hold.model.js';
import { ReadingModel } from '../holds/reading.model.js';
import { TestUpModel } from '../holds/test-up.model.js';
import { LedgerEntryModel } from '../ledger/ledger-entry.model.js';
import { HouseModelVersionModel } from '../lots/houses/house-model-version.model.js';
import { HouseModelModel } from '../lots/houses/house-model.model.js';
import { LotConsentModel } from '../lots/lot-consent.model.js';
import { LotUnitModel } from '../lots/lot-unit.model.js';
import { LotModel } from '../lots/lot.model.js';
import { TractModel } from '../lots/tract.model.js';
import { DeliveryModel } from '../notices/delivery.model.js';
import { NoticeModel } from '../notices/notice.model.js';
import { OutboxEventModel } from '../notices/outbox-event.model.js';
import { CorrectionModel } from '../outcomes/correction.model.js';
import { OutcomeSystemModel } from '../outcomes/outcome-system.model.js';
import { OutcomeWorkModel } from '../outcomes/outcome-work.model.js';
import { OutcomeModel } from '../outcomes/outcome.model.js';
import { CommentModel } from '../threads/comment.model.js';
import { TestPlanModel } from '../plans/test-plan.model.js';
import { VisitModel } from '../visits/visit.model.js';

/** Every model, for Sequelize to know. */
export const models = [
  ClearanceModel,
  ClosureModel,
  CommentModel,
  CorrectionModel,
  DeliveryModel,
  DepartmentModel,
  HoldModel,
  HouseModelModel,
  HouseModelVersionModel,
  InvitationModel,
  LedgerEntryModel,
  LinkTokenModel,
  LotConsentModel,
  LotModel,
  LotUnitModel,
  MembershipModel,
  NoticeModel,
  OrganizationModel,
  OutboxEventModel,
  OutcomeModel,
  OutcomeSystemModel,
  OutcomeWorkModel,
  PastPartyModel,
  PersonModel,
  ReadingModel,
  RefreshTokenModel,
  RuleCardModel,
  SessionModel,
  TestPlanModel,
  TestUpModel,
  TractModel,
  VisitModel,
];
