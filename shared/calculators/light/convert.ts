import { z } from 'zod';
import { defineCalculator } from '../../contract/defineCalculator';
import { exactlyOne } from '../../contract/exactlyOne';
import { lightEv100 } from '../../contract/light';
import { ev100In, illuminanceIn, luminanceIn, meterConstants } from '../../contract/quantities';
import { illuminanceOfEv100, luminanceOfEv100 } from '../../math/exposure';

export const lightConvert = defineCalculator({
  id: 'light/convert',
  title: 'Light in three units',
  summary: 'EV at ISO 100, luminance and illuminance of the same light, with the meter constants named.',
  units: 1,
  input: exactlyOne(
    'ev100',
    'luminanceCdM2',
    'illuminanceLux',
  )(
    z.strictObject({
      ev100: ev100In().optional(),
      luminanceCdM2: luminanceIn().optional(),
      illuminanceLux: illuminanceIn().optional(),
      ...meterConstants,
    }),
  ),
  output: z.strictObject({
    ev100: z.number().meta({ title: 'EV at ISO 100', unit: 'stops' }),
    luminanceCdM2: z.number().meta({ title: 'Luminance', unit: 'cd/m²' }),
    illuminanceLux: z.number().meta({ title: 'Illuminance', unit: 'lx' }),
    reflectedK: z.number().meta({ title: 'Meter constant K' }),
    incidentC: z.number().meta({ title: 'Meter constant C' }),
  }),
  sources: [
    'L = 2^EV·K/100 and E = 2^EV·C/100, as the colour-science project quotes ISO 2720:1974',
    'K and C are conventions: K 12.5 and C 250 together imply a reflectance of 15.7 %, not 18 %',
  ],
  examples: [
    {
      title: 'EV 13 is 1,024 cd/m² and 20,480 lx with the usual constants',
      input: { ev100: 13 },
      output: { ev100: 13, luminanceCdM2: 1024, illuminanceLux: 20480, reflectedK: 12.5, incidentC: 250 },
    },
    {
      title: 'A lit pavement of 20 lx is three stops over 2.5 lx, EV 3',
      input: { illuminanceLux: 20 },
      output: { ev100: 3, luminanceCdM2: 1, illuminanceLux: 20, reflectedK: 12.5, incidentC: 250 },
    },
  ],
  compute(input) {
    const ev100 = lightEv100(input);
    return {
      result: {
        ev100,
        luminanceCdM2: input.luminanceCdM2 ?? luminanceOfEv100(ev100, input.reflectedK),
        illuminanceLux: input.illuminanceLux ?? illuminanceOfEv100(ev100, input.incidentC),
        reflectedK: input.reflectedK,
        incidentC: input.incidentC,
      },
    };
  },
});
