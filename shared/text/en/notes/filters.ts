import { readable } from '../format';

export const filtersNotes = {
  density_near_whole_stops: (p: { density: number; stops: number; whole: number }) =>
    `Density ${readable(p.density)} takes ${readable(p.stops)} stops, a little off the ${p.whole} that it is often sold as.`,
  polarisers_are_ideal: () =>
    'Crossed polarisers are taken as perfect; real pairs tint the picture, darken its corners unevenly and never close altogether. The loss counts from their brightest position.',
  film_needs_more_time: () =>
    'On film, times beyond 1 s need the reciprocity correction (exposure/long) on top; a sensor needs none.',
  gels_differ: () =>
    'The two series stand for makers’ sheets of equal names and unequal shifts, from common practice without a published standard; go by the mired value on the sheet.',
  gels_only_warm: () =>
    'This light has to get cooler, and both series only warm. Look for a blue sheet of this shift, or gel the other light instead.',
  gel_not_near: (p: { errorMired: number }) =>
    `No one or two sheets come nearer than ${readable(p.errorMired)} mired, a difference that shows.`,
  white_balance_on_gelled: () =>
    'No other light was named, so it is taken to be of the colour that the gelled light gets; the white balance then keeps both neutral.',
  white_balance_on_other: (p: { cast: number }) =>
    `The white balance keeps the other light neutral; the gelled one then looks ${
      p.cast === 0
        ? 'neutral too'
        : `${readable(Math.abs(p.cast))} mired ${p.cast > 0 ? 'warmer' : 'cooler'} than neutral`
    }.`,
} as const;
