export interface LockFile {
  packages: Record<string, { version?: string; optional?: boolean }>;
}
export function findMissingPackages(lock: LockFile, installed: LockFile | null): string[];
