interface Stretch {
  readonly fromStops: number;
  readonly toStops: number;
  readonly label?: string;
}

/**
 * Lanes for stretches along an axis, so that none covers another; those that only touch share a lane. A labelled
 * one has a lane to itself, where its words have room.
 */
export function lanesOf(stretches: readonly Stretch[]): number[] {
  const taken: [low: number, high: number][][] = [];
  return stretches.map(({ fromStops, toStops, label }) => {
    const low = Math.min(fromStops, toStops);
    const high = Math.max(fromStops, toStops);
    const free = label
      ? -1
      : taken.findIndex((lane) => lane.every(([from, to]) => high <= from || low >= to));
    const lane = free < 0 ? taken.length : free;
    (taken[lane] ??= []).push([low, high]);
    return lane;
  });
}
