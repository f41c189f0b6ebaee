import type { Reading } from '../../../shared/contract/settings';
import { nearestMark } from '../../../shared/math/marks';
import { exactOf } from '../../../shared/contract/settings';
import type { SettingIn } from '../../../shared/contract/settingIn';

type Kind = 'aperture' | 'shutter' | 'iso';
type Row = Readonly<Record<Kind, { readonly mark: string }>>;

const KINDS: readonly Kind[] = ['aperture', 'shutter', 'iso'];

/** Whether a row's marks are the ones that the settings in question stand nearest to. */
export function isChosenRow(row: Row, body: Readonly<Record<string, unknown>>, reading: Reading): boolean {
  return KINDS.every((kind) => {
    const value = body[kind] as SettingIn | undefined;
    if (value === undefined) return false;
    const exact = exactOf(kind, value, reading);
    return exact > 0 && nearestMark(kind, reading.scale, exact).label === row[kind].mark;
  });
}

/** A mark as it goes into a request. */
export function markInput(kind: Kind, { mark }: { readonly mark: string }): SettingIn {
  return kind === 'iso' ? Number(mark) : mark;
}
