import type { RuleCardContent } from '@holdwater/shared-types/departments/rule-card.content.js';
import type { DemoOrganizationKey } from './demo-people.js';
export interface DemoDepartment {
    key: DemoOrganizationKey;
    zone: string;
    elevationFt: number;
    isOutside: boolean;
    ruleCard: {
        version: number;
        content: RuleCardContent;
    } | null;
}
/** Three departments that differ in nearly everything, and one that is not on Holdwater. */
export declare const demoDepartments: readonly DemoDepartment[];
