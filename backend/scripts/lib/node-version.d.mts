export function checkPlatform(version?: string, platform?: string): void;
