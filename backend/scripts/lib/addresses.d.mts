export interface DemoPerson {
  email: string;
  password: string;
  role: string;
  organization?: string;
}
export interface Addresses {
  web: string;
  api: string;
  mailbox: string;
  database: string;
  demo: DemoPerson[];
}
export function findAddresses(file?: string): Addresses | null;
export function writeAddresses(addresses: Omit<Addresses, 'api'>, file?: string): Addresses;
export function removeAddresses(file?: string): void;
export function formatSignIns(demo: DemoPerson[]): string[];
