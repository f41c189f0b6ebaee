import { describe, expect, it } from 'vitest';
import type { Field } from '../../../shared/contract/field';
import { placeOfSetting, settingMarks } from '../../../src/form/settingMarks';
import { placeOfStops, stopsPlaces, thirdsAsStops } from '../../../src/form/stopsRuler';

const third = { scale: 'third', readAs: 'mark' } as const;

describe('marks of a setting', () => {
  it('run from less to more light, over usual gear, in thirds', () => {
    const apertures = settingMarks('aperture', 'third');
    // Ten stops from f/32 to f/1, three marks each (ISO 517 names the full stops).
    expect(apertures).toHaveLength(31);
    expect([apertures[0]?.label, apertures[1]?.label, apertures.at(-1)?.label]).toEqual([
      'f/32',
      'f/29',
      'f/1.0',
    ]);
    const shutters = settingMarks('shutter', 'full');
    expect([shutters[0]?.label, shutters.at(-1)?.label, shutters.length]).toEqual(['1/8000', '30s', 19]);
    const isos = settingMarks('iso', 'full');
    expect([isos[0]?.value, isos.at(-1)?.value]).toEqual([50, 102400]);
    const powers = settingMarks('power', 'third');
    expect([powers[0]?.label, powers[1]?.label, powers.at(-1)?.label]).toEqual(['1/256', '1/256+1/3', '1/1']);
  });

  it('say which of them are full stops', () => {
    const full = settingMarks('aperture', 'third').filter(({ isFullStop }) => isFullStop);
    expect(full.map(({ label }) => label).slice(0, 4)).toEqual(['f/32', 'f/22', 'f/16', 'f/11']);
    expect(full).toHaveLength(11);
  });

  it.each(['aperture', 'shutter', 'iso', 'power'] as const)('stand at their own place (%s)', (kind) => {
    for (const scale of ['full', 'half', 'third'] as const)
      settingMarks(kind, scale).forEach(({ value, label }, i) =>
        expect(placeOfSetting(kind, value, { scale, readAs: 'mark' }), label).toBe(i),
      );
  });

  it('hold what lies beyond at the end, and nothing where no setting is said', () => {
    expect(placeOfSetting('aperture', 0.7, third)).toBe(30);
    expect(placeOfSetting('aperture', 'f/90', third)).toBe(0);
    expect(placeOfSetting('shutter', '600s', third)).toBe(settingMarks('shutter', 'third').length - 1);
    for (const nothing of ['wide', undefined, '', -1, 0, { a: 1 }])
      expect(placeOfSetting('aperture', nothing, third)).toBeNull();
  });
});

describe('the ruler of a number in stops', () => {
  const field = (name: string, minimum: number, maximum: number): Field => ({
    name,
    kind: 'number',
    unit: 'stops',
    title: name,
    required: true,
    advanced: false,
    minimum,
    maximum,
  });

  it('covers the scene list for light, ten stops for a loss, five to each side else', () => {
    const ends = (one: Field) => {
      const places = stopsPlaces(one);
      return [places[0]?.label, places.at(-1)?.label, places.length];
    };
    expect(ends(field('ev100', -30, 40))).toEqual(['−6', '16', 67]);
    expect(ends(field('ndStops', 0, 40))).toEqual(['0', '10', 31]);
    expect(ends(field('brightnessStops', -60, 60))).toEqual(['−5', '5', 31]);
    expect(ends(field('extraLossStops', 0, 3))).toEqual(['0', '3', 10]);
  });

  it('stands only beside numbers in stops', () => {
    expect(stopsPlaces({ ...field('distance', 0, 9), unit: 'm' })).toEqual([]);
  });

  it('clicks in thirds and holds what lies beyond', () => {
    const places = stopsPlaces(field('brightnessStops', -60, 60));
    expect(placeOfStops(places, 0)).toBe(15);
    expect(placeOfStops(places, 0.34)).toBe(16);
    expect(placeOfStops(places, 40)).toBe(30);
    expect(placeOfStops(places, undefined)).toBeNull();
    places.forEach(({ thirds }, i) => expect(placeOfStops(places, thirdsAsStops(thirds))).toBe(i));
  });
});
