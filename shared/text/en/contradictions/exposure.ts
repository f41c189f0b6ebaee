export const exposureContradictions = {
  limits_crossed: (p: Record<string, unknown>) =>
    `${String(p.low)} must not be above ${String(p.high)}; the limits leave nothing between them.`,
} as const;
