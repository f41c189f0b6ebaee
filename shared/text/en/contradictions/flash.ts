import { amount, readable, seconds } from '../format';

export const flashContradictions = {
  needed_together: (p: Record<string, unknown>) =>
    `${String(p.missing)} is needed where ${String(p.given)} is given.`,
  curtain_slower_than_sync: (p: Record<string, unknown>) =>
    `A curtain never travels longer than the sync speed of ${seconds(Number(p.syncSpeedS))}; ${seconds(Number(p.curtainS))} was given.`,
  frame_never_open: (p: Record<string, unknown>) =>
    `The curtain must take less than the shutter’s ${seconds(Number(p.shutterS))}, or the frame is never wholly open and needs high-speed sync; ${seconds(Number(p.curtainS))} was given.`,
  ambient_explains_result: (p: Record<string, unknown>) =>
    `The ambient light alone must be darker than the result of ${amount(Number(p.resultStops), 'stops')}, or nothing is left for the flash; it was given as ${amount(Number(p.ambientStops), 'stops')}.`,
  far_before_near: (p: Record<string, unknown>) =>
    `The far end lies no nearer than the near end at ${readable(Number(p.nearM))} m; ${readable(Number(p.farM))} m was given.`,
} as const;
