export function builtFolder(
  parent: string,
  name: string,
  build: (folder: string) => Promise<void>,
): Promise<string>;
