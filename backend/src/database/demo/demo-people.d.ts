import type { MemberRole, OrganizationKind } from '@holdwater/shared-types/accounts/roles.js';
/** One password for every demo person; the demo listens on loopback only. */
export declare const demoPassword = "the needle stays put";
export interface DemoOrganization {
    key: string;
    name: string;
    kind: OrganizationKind;
    phone: string;
}
export declare const demoOrganizations: readonly [{
    readonly key: "odderly";
    readonly name: "Odderly Homes";
    readonly kind: "builder";
    readonly phone: "555-0140";
}, {
    readonly key: "penmarrow";
    readonly name: "Penmarrow Builders";
    readonly kind: "builder";
    readonly phone: "555-0147";
}, {
    readonly key: "dunlatch";
    readonly name: "Dunlatch Plumbing";
    readonly kind: "plumber";
    readonly phone: "555-0115";
}, {
    readonly key: "merrow";
    readonly name: "Merrow Pipe and Drain";
    readonly kind: "plumber";
    readonly phone: "555-0121";
}, {
    readonly key: "two-bells";
    readonly name: "Two Bells Plumbing";
    readonly kind: "plumber";
    readonly phone: "555-0126";
}, {
    readonly key: "tallowmere";
    readonly name: "Tallowmere Building Dept.";
    readonly kind: "department";
    readonly phone: "555-0160";
}, {
    readonly key: "vennick";
    readonly name: "Vennick County";
    readonly kind: "department";
    readonly phone: "555-0170";
}, {
    readonly key: "ashquill";
    readonly name: "Ashquill Building Office";
    readonly kind: "department";
    readonly phone: "555-0180";
}, {
    readonly key: "corrow";
    readonly name: "Corrow Township";
    readonly kind: "department";
    readonly phone: "555-0190";
}];
export type DemoOrganizationKey = (typeof demoOrganizations)[number]['key'];
export interface DemoPerson {
    key: string;
    name: string;
    email: string;
    phone: string;
    locale: 'en' | 'es';
    memberships: Array<{
        organization: DemoOrganizationKey;
        roles: MemberRole[];
    }>;
    isOperator?: boolean;
}
export declare const demoPeople: readonly DemoPerson[];
/** The installation's own name beside its operator. */
export declare const installationName = "Holdwater installation";
export interface DemoSignIn {
    email: string;
    password: string;
    role: string;
    organization: string;
}
/** Every demo sign-in, one line a role, the first of each role before the others. */
export declare function demoSignIns(): DemoSignIn[];
