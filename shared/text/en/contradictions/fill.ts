import { quoted, readable, seconds } from '../format';

export const fillContradictions = {
  name_twice: (p: Record<string, unknown>) =>
    `Each flash has a name of its own; ${quoted(p.name)} stands there twice.`,
  too_many_power_settings: (p: Record<string, unknown>) =>
    `The flashes with the role ${String(p.role)} can be set in ${readable(Number(p.ways))} ways together, and at most ${readable(Number(p.mostWays))} are gone through. Raise minPower or powerStep, leave t05S out, or give flashes that stand together and fire alike as one, with a list of guide numbers.`,
  flashes_without_sync: () => 'Without sync no flash is fired; leave the flashes out, or name the sync.',
  shutter_too_fast_for_sync: (p: Record<string, unknown>) =>
    `At ${seconds(Number(p.shutterS))} the frame is never wholly open, as the sync speed is ${seconds(Number(p.syncSpeedS))}; take a slower shutter or high-speed sync.`,
  high_speed_sync_missing: () =>
    'The sync is high-speed, so the camera needs highSpeedSync; {} stands for usual values.',
  high_speed_sync_for_faster: (p: Record<string, unknown>) =>
    `High-speed sync is for shutters faster than the sync speed of ${seconds(Number(p.syncSpeedS))}; ${seconds(Number(p.shutterS))} was given, where one ordinary pulse lights the whole frame.`,
} as const;
