import type { Answer } from '../../../shared/contract/answer';
import type { Saved } from '../../composables/useSavedAnswer';

interface Marked {
  readonly mark: string;
}

interface Recipe {
  readonly settings: {
    readonly aperture: Marked;
    readonly shutter: Marked;
    readonly iso: Marked;
    readonly ndStops: number;
  };
  readonly flashes: readonly { readonly name: string; readonly power: Marked; readonly distanceM: number }[];
}

interface Rung {
  readonly at: string;
  readonly aperture: Marked;
  readonly shutter: Marked;
  readonly iso: Marked;
  readonly power?: Marked | null;
}

export interface SavedRow {
  readonly head: string;
  readonly settings: string;
  readonly flash: string;
}

/** What is to be set for a saved question: a row a recipe, best first, or a row a rung, in order of time. */
export function savedRows({ kind }: Saved, answer: Answer<unknown>): SavedRow[] {
  const line = ({ aperture, shutter, iso }: Pick<Rung, 'aperture' | 'shutter' | 'iso'>) =>
    `${aperture.mark}, ${shutter.mark}, ISO ${iso.mark}`;
  if (kind === 'evening')
    return (answer.result as { rungs: readonly Rung[] }).rungs.map((rung) => ({
      head: rung.at.slice(11, 16),
      settings: line(rung),
      flash: rung.power?.mark ?? '',
    }));
  return (answer.result as { recipes: readonly Recipe[] }).recipes.map(({ settings, flashes }, i) => ({
    head: String(i + 1),
    settings: line(settings) + (settings.ndStops > 0 ? `, filter ${settings.ndStops} stops` : ''),
    flash: flashes
      .map(({ name, power, distanceM }) => `${name} ${power.mark} at ${distanceM.toFixed(2)} m`)
      .join('; '),
  }));
}
