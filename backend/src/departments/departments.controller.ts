import { Controller } from '@nestjs/common';
import {
  listDepartments,
  listPublicRuleCards,
  readDepartment,
} from '@holdwater/shared-types/departments/departments.contract.js';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import { anyone, signedIn } from '../common/access/access.js';
import type { Actor } from '../common/access/actor.js';
import { CurrentActor } from '../common/access/current-actor.js';
import { Input } from '../common/contract/contract-input.js';
import { ContractRoute } from '../common/contract/contract-route.js';
import { ReadDepartmentsService } from './read-departments.service.js';

@Controller()
export class DepartmentsController {
  constructor(private readonly reading: ReadDepartmentsService) {}

  @ContractRoute(listDepartments, signedIn('departments.canReadDepartments'))
  async list() {
    return { items: await this.reading.listDepartments() };
  }

  @ContractRoute(readDepartment, signedIn('departments.canReadDepartments'))
  async read(@Input() { params }: RouteInput<typeof readDepartment>, @CurrentActor() actor: Actor) {
    return this.reading.readDepartment(actor, params.departmentId);
  }

  @ContractRoute(listPublicRuleCards, anyone)
  async listPublic() {
    return { items: (await this.reading.listDepartments()).filter(({ ruleCard }) => ruleCard !== null) };
  }
}
