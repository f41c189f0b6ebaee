import { valueAt } from '../../form/body';
import { formatNumber, formatStops } from '../../text/formatQuantity';

const numberAt = (input: unknown, ...path: string[]) => {
  const value = valueAt(input, path);
  return typeof value === 'number' ? value : undefined;
};

/** The aim that the answer counted with. */
export function aimOf(input: unknown): { readonly backgroundStops: number; readonly subjectStops: number } {
  return {
    backgroundStops: numberAt(input, 'aim', 'backgroundStops') ?? 0,
    subjectStops: numberAt(input, 'aim', 'subjectStops') ?? 0,
  };
}

const settingText = (value: unknown) => (typeof value === 'number' ? formatNumber(value) : String(value));

/** How the light was told, in a sentence. */
export function lightLine(input: unknown): string {
  const below = numberAt(input, 'subjectAmbient', 'belowBackgroundStops');
  const subject =
    below === undefined
      ? `the subject in EV ${formatStops(numberAt(input, 'subjectAmbient', 'ev100') ?? 0)}`
      : `the subject ${formatStops(below)} stops under it`;
  const ev100 = numberAt(input, 'background', 'ev100');
  if (ev100 !== undefined) return `Background EV ${formatStops(ev100)}, ${subject}.`;
  const frame = (name: string) => settingText(valueAt(input, ['background', 'testFrame', name]));
  const came = formatStops(numberAt(input, 'background', 'testFrame', 'offsetStops') ?? 0);
  return `Background by a test frame at ${frame('aperture')}, ${frame('shutter')}, ISO ${frame('iso')}, which came out ${came} stops from a middle tone; ${subject}.`;
}
