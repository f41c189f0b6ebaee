import { expect, it } from 'vitest';
import { navigationFor, type NavigationLine } from '../../../src/router/navigation';
import { routes } from '../../../src/router/routes';

const LINES: readonly NavigationLine[] = [
  { title: 'Calculators', to: '/calculators' },
  { title: 'Keys', to: '/keys', roles: ['developer'] },
  { title: 'Both', to: '/both', roles: ['developer', 'educator'] },
];

it('a visitor sees the lines that are for everyone and for one of their roles', () => {
  const titles = (roles: Parameters<typeof navigationFor>[0]) =>
    navigationFor(roles, LINES).map(({ title }) => title);
  expect(titles([])).toEqual(['Calculators']);
  expect(titles(['educator'])).toEqual(['Calculators', 'Both']);
  expect(titles(['developer', 'photographer'])).toEqual(['Calculators', 'Keys', 'Both']);
});

it('every line of the navigation leads to a screen or to a page of the service', () => {
  const paths = routes.map(({ path }) => path);
  for (const line of navigationFor(['developer', 'photographer', 'educator', 'admin']))
    expect(line.isServed || paths.includes(line.to), line.to).toBe(true);
});
