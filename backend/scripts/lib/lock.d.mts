export type Release = () => Promise<void>;
export function tryLock(file: string): Promise<Release | null>;
export function getLock(file: string, waitingMessage: string): Promise<Release>;
export function withLock<T>(file: string, waitingMessage: string, work: () => Promise<T>): Promise<T>;
