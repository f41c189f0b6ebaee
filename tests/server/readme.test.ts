import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { settings } from '../../server/config';

const readme = readFileSync('README.md', 'utf8');

function rowsUnder(heading: string): string[][] {
  const section = readme.split(/^## /m).find((part) => part.startsWith(`${heading}\n`)) ?? '';
  const rows = section.split('\n').filter((line) => line.startsWith('|'));
  return rows.slice(2).map((row) =>
    row
      .split('|')
      .slice(1, -1)
      .map((cell) => cell.replaceAll('`', '').trim()),
  );
}

it('lists every setting with the fallback and the meaning that the code gives it', () => {
  const plain = (text: string) => text.replaceAll('`', '');
  const expected = settings.map(({ name, fallback, meaning }) => [name, plain(fallback), plain(meaning)]);
  expect(rowsUnder('Settings')).toEqual(expected);
});

it('lists every command that package.json has', () => {
  const { scripts } = JSON.parse(readFileSync('package.json', 'utf8')) as { scripts: Record<string, string> };
  const listed = rowsUnder('Commands').map(
    ([command = '']) => command.replace(/^npm (run )?(--silent )?/, '').split(' ')[0],
  );
  expect(listed.sort()).toEqual(Object.keys(scripts).sort());
});
