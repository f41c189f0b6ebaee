export const lightContradictions = {
  units_mixed: (p: Record<string, unknown>) =>
    `All parts are in one unit; the first is given as ${String(p.first)}, this one as ${String(p.given)}.`,
} as const;
