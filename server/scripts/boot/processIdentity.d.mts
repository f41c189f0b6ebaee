export function processIdentity(pid: number): string | null;
export function isAlive(identity: string): boolean;
