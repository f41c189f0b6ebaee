/** The console's one clock. Computations get the time handed in. */
export const clock = {
  now: (): Date => new Date(),
};
