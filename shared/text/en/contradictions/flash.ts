import { readable } from '../format';

export const flashContradictions = {
  needed_together: (p: Record<string, unknown>) =>
    `${String(p.missing)} is needed where ${String(p.given)} is given.`,
  curtain_slower_than_sync: (p: Record<string, unknown>) =>
    `A curtain never travels longer than the sync speed of ${readable(Number(p.syncSpeedS))} s; ${readable(Number(p.curtainS))} s was given.`,
  frame_never_open: (p: Record<string, unknown>) =>
    `The curtain must take less than the shutter’s ${readable(Number(p.shutterS))} s, or the frame is never wholly open and needs high-speed sync; ${readable(Number(p.curtainS))} s was given.`,
  ambient_explains_result: (p: Record<string, unknown>) =>
    `The ambient light alone must be darker than the result of ${readable(Number(p.resultStops))} stops, or nothing is left for the flash; ${readable(Number(p.ambientStops))} stops was given.`,
  far_before_near: (p: Record<string, unknown>) =>
    `The far end lies no nearer than the near end at ${readable(Number(p.nearM))} m; ${readable(Number(p.farM))} m was given.`,
} as const;
