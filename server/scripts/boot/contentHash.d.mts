export function contentHash(root: string, paths: readonly string[]): string;
