import type { Type } from '@nestjs/common';
import { AccountsModule } from './accounts/accounts.module.js';
import { ClearancesModule } from './clearances/clearances.module.js';
import { DepartmentsModule } from './departments/departments.module.js';
import { LotsModule } from './lots/lots.module.js';
import { VisitsModule } from './visits/visits.module.js';
import { HoldsModule } from './holds/holds.module.js';
import { HandoversModule } from './handovers/handovers.module.js';
import { OutcomesModule } from './outcomes/outcomes.module.js';
import { ThreadsModule } from './threads/threads.module.js';
import { LedgerReadingModule } from './ledger/ledger-reading.module.js';
import { PlansModule } from './plans/plans.module.js';
import { RealtimeModule } from './realtime/realtime.module.js';
import { NoticesModule } from './notices/notices.module.js';
import { OperationsModule } from './operations/operations.module.js';

/** The modules with domain words, in the order their imports may go. */
export const features: Type[] = [
  AccountsModule,
  DepartmentsModule,
  LotsModule,
  PlansModule,
  ClearancesModule,
  VisitsModule,
  HoldsModule,
  HandoversModule,
  OutcomesModule,
  ThreadsModule,
  NoticesModule,
  LedgerReadingModule,
  RealtimeModule,
  OperationsModule,
];
