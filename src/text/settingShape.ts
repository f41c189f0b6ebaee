/** A setting as an answer gives it. */
export interface SettingShape {
  readonly exact: number;
  readonly mark: string;
  readonly residualStops?: number;
}

export function isSettingShape(value: unknown): value is SettingShape {
  return typeof value === 'object' && value !== null && 'mark' in value && 'exact' in value;
}
