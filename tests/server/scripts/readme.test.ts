import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { settings } from '../../../server/config';

const readme = readFileSync('README.md', 'utf8');
const { scripts } = JSON.parse(readFileSync('package.json', 'utf8')) as { scripts: Record<string, string> };

describe('the README', () => {
  it.each(settings.map((setting) => [setting.name, setting] as const))(
    'lists the setting %s with its default and meaning',
    (name, { fallback, meaning }) => {
      const row = readme.split('\n').find((line) => line.startsWith(`| \`${name}\` `));
      expect(row).toContain(fallback);
      expect(row).toContain(meaning);
    },
  );

  it('lists no setting that does not exist', () => {
    const listed = [...readme.matchAll(/^\| `([A-Z_]+)` +\|/gm)].map(([, name]) => name);
    expect(listed.sort()).toEqual(settings.map(({ name }) => name).sort());
  });

  it('names every command of package.json', () => {
    for (const script of Object.keys(scripts))
      expect(readme).toMatch(new RegExp(`npm (run (--silent )?)?${script}\\b`));
  });
});
