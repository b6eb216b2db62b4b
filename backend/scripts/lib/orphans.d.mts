export function removeOrphans(workspace: string): void;
