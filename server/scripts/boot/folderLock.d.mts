export function withFolderLock<Result>(
  path: string,
  work: () => Promise<Result>,
  options?: { waitingMs?: number; onWait?: (path: string) => void },
): Promise<Result>;
