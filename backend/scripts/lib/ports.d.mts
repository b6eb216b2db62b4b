export const loopback: string;
export function getChosenPort(text: string | undefined, fallback: number): number;
export function getFreePort(first: number, taken?: number[]): Promise<number>;
export function getRandomPort(): Promise<number>;
