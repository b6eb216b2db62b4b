import { Controller } from '@nestjs/common';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { analyseHold } from '@holdwater/shared-types/hydraulics/hold/analyse-hold.js';
import { calcRoutes } from '@holdwater/shared-types/hydraulics/calc.routes.js';
import { readDial } from '@holdwater/shared-types/hydraulics/dial.js';
import { planDwv } from '@holdwater/shared-types/hydraulics/dwv-plan.js';
import { planWater } from '@holdwater/shared-types/hydraulics/water-plan.js';
import { calcNotice } from '@holdwater/shared-types/scheduling/calc.routes.js';
import { signedIn } from '../common/access/access.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { computeNotice } from '../scheduling/working-time/notice.js';

/** Previews of what the app computes: nothing is kept, nothing of anybody's is read. */
@Controller()
export class CalcController {
  @ContractRoute(calcRoutes.dwvPlan, signedIn('own'))
  dwvPlan(@Input() input: RouteInput<typeof calcRoutes.dwvPlan>) {
    return planDwv(input.body);
  }

  @ContractRoute(calcRoutes.waterPlan, signedIn('own'))
  waterPlan(@Input() input: RouteInput<typeof calcRoutes.waterPlan>) {
    return planWater(input.body);
  }

  @ContractRoute(calcRoutes.hold, signedIn('own'))
  hold(@Input() input: RouteInput<typeof calcRoutes.hold>) {
    return analyseHold(input.body);
  }

  @ContractRoute(calcRoutes.dial, signedIn('own'))
  dial(@Input() input: RouteInput<typeof calcRoutes.dial>) {
    return readDial(input.body);
  }

  @ContractRoute(calcNotice, signedIn('own'))
  notice(@Input() input: RouteInput<typeof calcNotice>) {
    return computeNotice(input.body);
  }
}
