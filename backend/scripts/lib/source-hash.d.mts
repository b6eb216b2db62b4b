export function hashSources(base: string, places: string[]): string;
