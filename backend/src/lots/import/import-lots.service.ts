import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RouteInput } from '@holdwater/shared-types/common/route.js';
import type { ImportFault, importLots, ImportReport } from '@holdwater/shared-types/lots/lot-import.contract.js';
import { Op } from 'sequelize';
import type { Actor } from '../../common/access/actor.js';
import { UnitOfWork } from '../../common/unit-of-work/unit-of-work.js';
import { DepartmentsQueries } from '../../departments/departments.queries.js';
import { AddLotsService, refuseAdding } from '../add-lots.service.js';
import { LotModel } from '../lot.model.js';
import { readCsv } from './csv-table.js';
import { readHead } from './import-head.js';
import { type ReadLine, readLines } from './import-lines.js';
import { repeatedLots } from './repeated-lots.js';

type ImportGiven = RouteInput<typeof importLots>['body'];

/** What is read of a file before anything is written: lots, or what is wrong. */
interface Checked {
  readonly lines: readonly ReadLine[];
  readonly faults: readonly ImportFault[];
}

export const mostLots = 2000;

const wholeFile = (code: string, value: string | null): ImportFault => ({
  line: 0,
  column: null,
  code,
  value,
  suggestion: null,
});

/** Adds many lots from CSV: all of them, or none and a report of every fault. */
@Injectable()
export class ImportLotsService {
  constructor(
    @InjectModel(LotModel) private readonly lots: typeof LotModel,
    private readonly adding: AddLotsService,
    private readonly departments: DepartmentsQueries,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  /** A trial reads and writes nothing, whatever it finds. Throws `not-found`, `not-allowed`, `bad-input` as adding one lot does. */
  async import(actor: Actor, given: ImportGiven): Promise<ImportReport> {
    refuseAdding(actor, given.builderId);
    await this.adding.refuseTies(given);
    if (given.isTrial) return reportOf(await this.check(given), false);
    return this.unitOfWork.run(async () => {
      const checked = await this.check(given);
      if (checked.faults.length > 0) return reportOf(checked, false);
      const drafts = checked.lines.map(({ draft }) => draft);
      await this.adding.add(actor, drafts, given);
      return reportOf(checked, true);
    });
  }

  private async check(given: ImportGiven): Promise<Checked> {
    const table = readCsv(given.csv);
    if (!('head' in table)) return { lines: [], faults: [table] };
    const { columns, faults: headFaults } = readHead(table.head);
    if (headFaults.length > 0) return { lines: [], faults: headFaults };
    if (table.lines.length === 0) return { lines: [], faults: [wholeFile('empty', null)] };
    if (table.lines.length > mostLots)
      return { lines: [], faults: [wholeFile('too-many-lines', String(table.lines.length))] };
    const department = given.departmentId ? await this.departments.findDepartment(given.departmentId) : null;
    const { read, faults } = readLines(table.lines, columns, department?.zone ?? null);
    const all = [...faults, ...(await this.repeated(read, given))];
    return { lines: read, faults: all.sort((a, b) => a.line - b.line) };
  }

  private async repeated(lines: readonly ReadLine[], { builderId, tractId }: ImportGiven): Promise<ImportFault[]> {
    const key = tractId ? 'number' : 'address';
    const values = lines.map(({ draft }) => draft[key]);
    const where = tractId ? { tractId } : { builderId, tractId: null };
    const standing = await this.lots.findAll({ attributes: [key], where: { ...where, [key]: { [Op.in]: values } } });
    return repeatedLots(lines, key, new Set(standing.map((lot) => lot[key])));
  }
}

function reportOf({ lines, faults }: Checked, isImported: boolean): ImportReport {
  return { isImported, lots: lines.length, faults: [...faults] };
}
