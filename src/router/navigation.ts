export type Role = 'developer' | 'photographer' | 'educator' | 'admin';

/** A line of the navigation: a screen of the console, or a page that the service itself serves. */
export interface NavigationLine {
  readonly title: string;
  readonly to: string;
  readonly isServed?: boolean;
  /** Who sees it; everyone where nothing is said. */
  readonly roles?: readonly Role[];
}

const LINES: readonly NavigationLine[] = [
  { title: 'Calculators', to: '/calculators' },
  { title: 'Evening', to: '/evening' },
  { title: 'Fill', to: '/fill' },
  { title: 'Kit', to: '/kit', roles: ['photographer'] },
  { title: 'Saved', to: '/recipes', roles: ['photographer'] },
  { title: 'Try it', to: '/try', roles: ['developer'] },
  { title: 'Keys', to: '/keys', roles: ['developer'] },
  { title: 'Usage', to: '/usage', roles: ['developer'] },
  { title: 'API reference', to: '/docs', isServed: true },
];

/** The lines that a visitor with these roles sees, in order. */
export function navigationFor(
  roles: readonly Role[],
  lines: readonly NavigationLine[] = LINES,
): readonly NavigationLine[] {
  return lines.filter((line) => !line.roles || line.roles.some((role) => roles.includes(role)));
}
