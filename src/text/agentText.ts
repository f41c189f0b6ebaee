type Named = readonly (readonly [pattern: RegExp, name: string])[];

// The order matters: most browsers also call themselves by the names of those that came before them.
const BROWSERS: Named = [
  [/\bEdg/, 'Edge'],
  [/\bOPR\//, 'Opera'],
  [/\b(Firefox|FxiOS)\//, 'Firefox'],
  [/Chrom(e|ium)\/|\bCriOS\//, 'Chrome'],
  [/\bSafari\//, 'Safari'],
];
const SYSTEMS: Named = [
  [/iPhone|iPad/, 'iOS'],
  [/Android/, 'Android'],
  [/Windows/, 'Windows'],
  [/Mac OS X/, 'macOS'],
  [/CrOS/, 'ChromeOS'],
  [/Linux/, 'Linux'],
];

const nameIn = (agent: string, names: Named) => names.find(([pattern]) => pattern.test(agent))?.[1];

/** What a browser calls itself, as far as a person needs it to know their own again: Firefox on Windows. */
export function agentText(agent: string): string {
  const browser = nameIn(agent, BROWSERS);
  const system = nameIn(agent, SYSTEMS);
  if (!browser && !system) return 'A browser or program';
  return [browser ?? 'A browser', system].filter(Boolean).join(' on ');
}
