export interface ProcessRecord {
  pid: number;
  startTicks: number | null;
  marker: string;
}
export function describeProcess(pid: number, marker: string): ProcessRecord;
export function isSameProcess(record: ProcessRecord | null): boolean;
export function findStartTicks(pid: number): number | null;
