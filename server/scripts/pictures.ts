import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { buildEntry } from './support/buildClient';
import { dataFolder } from './support/place';

type Pictures = { takePictures(folder: string, only: readonly string[]): Promise<void> };

/** `npm run pictures [part of an id ...]`: every calculator's page as it looks, to be looked at one by one. */
export async function main(args: readonly string[]): Promise<void> {
  const entry = await buildEntry('tests/browser/pictures.ts', ['tests/browser', 'tests/support', 'src']);
  const { takePictures } = (await import(pathToFileURL(join(entry, 'pictures.js')).href)) as Pictures;
  await takePictures(join(dataFolder, 'pictures'), args);
}
