declare module 'astronomia/data/vsop87Bearth' {
  const series: object;
  export default series;
}
declare module 'astronomia/planetposition' {
  export class Planet {
    constructor(series: object);
  }
}
declare module 'astronomia/solar' {
  import type { Planet } from 'astronomia/planetposition';
  export function apparentEquatorialVSOP87(
    planet: Planet,
    jde: number,
  ): { ra: number; dec: number; range: number };
}
declare module 'astronomia/sidereal' {
  export function apparent(jd: number): number;
}
declare module 'astronomia/deltat' {
  export function deltaT(year: number): number;
}
