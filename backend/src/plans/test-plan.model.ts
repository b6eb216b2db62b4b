import type { Medium, Method, System } from '@holdwater/shared-types/holds/hold.states.js';
import type { DwvPlan } from '@holdwater/shared-types/hydraulics/dwv-plan.contract.js';
import type { HouseGeometry } from '@holdwater/shared-types/hydraulics/house-geometry.js';
import type { WaterPlan } from '@holdwater/shared-types/hydraulics/water-plan.contract.js';
import type { PlanTools } from '@holdwater/shared-types/plans/plan-tools.js';
import { Column, DataType, Model, PrimaryKey, Table } from 'sequelize-typescript';

/** The method chosen for a unit, stage and system. Never edited: superseded, and kept. */
@Table({ tableName: 'test_plans', timestamps: false, underscored: true })
export class TestPlanModel extends Model {
  @PrimaryKey
  @Column(DataType.UUID)
  declare id: string;

  @Column(DataType.UUID)
  declare clientId: string;

  @Column(DataType.UUID)
  declare lotId: string;

  @Column(DataType.INTEGER)
  declare unitNumber: number;

  @Column(DataType.TEXT)
  declare stageCode: string;

  @Column(DataType.TEXT)
  declare system: System;

  @Column(DataType.TEXT)
  declare method: Method;

  @Column(DataType.TEXT)
  declare medium: Medium;

  @Column(DataType.JSONB)
  declare tools: PlanTools;

  @Column(DataType.UUID)
  declare ruleCardId: string;

  @Column(DataType.JSONB)
  declare geometry: HouseGeometry;

  /** SHA-256 of the geometry's canonical JSON. */
  @Column(DataType.TEXT)
  declare geometryDigest: string;

  @Column(DataType.BOOLEAN)
  declare isGroundwork: boolean;

  @Column(DataType.JSONB)
  declare answer: { dwv: DwvPlan | null; water: WaterPlan | null };

  @Column(DataType.UUID)
  declare chosenBy: string;

  @Column(DataType.DATE)
  declare chosenAt: Date;

  @Column(DataType.DATE)
  declare receivedAt: Date;

  @Column(DataType.DATE)
  declare supersededAt: Date | null;
}
