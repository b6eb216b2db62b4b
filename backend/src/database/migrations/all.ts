import { accounts } from './0001-accounts.js';
import { departments } from './0002-departments.js';
import { lots } from './0003-lots.js';
import { visits } from './0004-visits.js';
import { holds } from './0005-holds.js';
import { outcomes } from './0006-outcomes.js';
import { threads } from './0007-threads.js';
import { ledger } from './0008-ledger.js';
import { notices } from './0009-notices.js';
import { requests } from './0010-requests.js';
import { oneLot } from './0011-one-lot.js';
import { knownRules } from './0012-known-rules.js';
import { keptRight } from './0013-kept-right.js';
import { handovers } from './0014-handovers.js';
import { anchors } from './0015-anchors.js';
import { testPlans } from './0017-test-plans.js';
import { plannedHolds } from './0019-planned-holds.js';
import { houseModels } from './0020-house-models.js';
import { ruleCardDrafts } from './0018-rule-card-drafts.js';
import type { Migration } from './migration.js';

/** Every step, in order. */
export const migrations: readonly Migration[] = [
  accounts,
  departments,
  lots,
  visits,
  holds,
  outcomes,
  threads,
  ledger,
  notices,
  requests,
  oneLot,
  knownRules,
  keptRight,
  handovers,
  anchors,
  testPlans,
  ruleCardDrafts,
  plannedHolds,
  houseModels,
];
