import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { refuse } from '../common/errors/app-error.js';

/** A department with what belongs to its organization. */
export interface DepartmentRecord {
  readonly id: string;
  readonly name: string;
  readonly phone: string | null;
  readonly zone: string;
  readonly elevationFt: number;
  readonly isOutside: boolean;
}

/** How other modules read departments. */
@Injectable()
export class DepartmentsQueries {
  constructor(@InjectConnection() private readonly sequelize: Sequelize) {}

  /** Throws `not-found`. */
  async getDepartment(id: string): Promise<DepartmentRecord> {
    return (await this.findDepartment(id)) ?? refuse('not-found');
  }

  async findDepartment(id: string): Promise<DepartmentRecord | null> {
    return (await this.getDepartments([id])).get(id) ?? null;
  }

  /** By id; those that do not exist are left out. */
  async getDepartments(ids: readonly string[]): Promise<Map<string, DepartmentRecord>> {
    const found = await this.select('WHERE d.id = ANY (ARRAY[:ids]::uuid[])', { ids: [...ids] });
    return new Map(found.map((department) => [department.id, department]));
  }

  /** Every department, by name. */
  async listDepartments(): Promise<DepartmentRecord[]> {
    return this.select('ORDER BY o.name, d.id', {});
  }

  /** Locks a department against another change of its rule cards or closures. Throws `not-found`. */
  async lockDepartment(id: string): Promise<DepartmentRecord> {
    const [found] = await this.select('WHERE d.id = :id FOR UPDATE OF d', { id });
    return found ?? refuse('not-found');
  }

  private async select(rest: string, replacements: Record<string, unknown>): Promise<DepartmentRecord[]> {
    return this.sequelize.query<DepartmentRecord>(
      `SELECT d.id, o.name, o.phone, d.zone, d.elevation_ft AS "elevationFt", d.is_outside AS "isOutside"
       FROM departments d JOIN organizations o ON o.id = d.id ${rest}`,
      { replacements, type: QueryTypes.SELECT },
    );
  }
}
