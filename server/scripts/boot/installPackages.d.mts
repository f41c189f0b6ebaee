export function installPackages(root: string, install?: (root: string) => Promise<void>): Promise<void>;
export function isInstalledAlready(root: string): boolean;
