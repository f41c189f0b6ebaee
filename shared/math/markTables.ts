/**
 * The markings that stand on cameras and lenses, by position on their scale.
 *
 * Aperture: ISO 517 names full stops; third and half stops are trade practice, as tabulated in an
 * encyclopaedia's article on the f-number (f/1 to f/22) and continued from memory outside that span.
 * Shutter: ISO 516 (JIS B 7091) for full stops; third and half stops are trade practice.
 * ISO: the list of ISO 5800 and ISO 12232 (from memory); half stops are common practice, no source.
 */
export type Scale = 'full' | 'half' | 'third';
export type MarkedKind = 'aperture' | 'shutter' | 'iso';

/** A run of labels; the first stands at position `from`, each next one `step` positions further. */
export interface LabelRun {
  readonly from: number;
  readonly step: number;
  readonly labels: readonly string[];
}

const run = (from: number, step: number, labels: string): LabelRun => ({
  from,
  step,
  labels: labels.split(' '),
});

/** Positions count thirds of a stop (Av·3, Tv·3, stops above ISO 100 times 3). */
export const THIRDS: Record<MarkedKind, LabelRun> = {
  aperture: run(
    -3,
    1,
    '0.7 0.8 0.9 1.0 1.1 1.2 1.4 1.6 1.8 2 2.2 2.5 2.8 3.2 3.5 4 4.5 5.0 5.6 6.3 7.1 8 9 10 11 13 14 16 18 20 22 25 29 32 36 40 45 51 57 64',
  ),
  shutter: run(
    -15,
    1,
    '30 25 20 15 13 10 8 6 5 4 3.2 2.5 2 1.6 1.3 1 0.8 0.6 0.5 0.4 0.3 1/4 1/5 1/6 1/8 1/10 1/13 1/15 1/20 1/25 1/30 1/40 1/50 1/60 1/80 1/100 1/125 1/160 1/200 1/250 1/320 1/400 1/500 1/640 1/800 1/1000 1/1250 1/1600 1/2000 1/2500 1/3200 1/4000 1/5000 1/6400 1/8000 1/10000 1/12800 1/16000 1/20000 1/25600 1/32000',
  ),
  iso: run(
    -9,
    1,
    '12 16 20 25 32 40 50 64 80 100 125 160 200 250 320 400 500 640 800 1000 1250 1600 2000 2500 3200 4000 5000 6400 8000 10000 12800 16000 20000 25600 32000 40000 51200 64000 80000 102400',
  ),
};

/** Positions count halves of a stop; only the odd ones stand here, the even ones are full stops. */
export const HALVES: Record<MarkedKind, LabelRun> = {
  aperture: run(-1, 2, '0.85 1.2 1.7 2.4 3.3 4.8 6.7 9.5 13 19 27 38 54'),
  shutter: run(
    -9,
    2,
    '20 10 6 3 1.5 0.7 0.3 1/6 1/10 1/20 1/45 1/90 1/180 1/350 1/750 1/1500 1/3000 1/6000 1/12000 1/24000',
  ),
  iso: run(-5, 2, '18 35 70 140 280 560 1100 2200 4500 9000 18000 36000 72000'),
};

/** The slowest marked time is 30 s, which stands for 2^5 s; longer times are the seconds themselves. */
export const SLOWEST_MARKED_S = 32;
