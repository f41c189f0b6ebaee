const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);

/** "exposure/value" and "Input" make "ExposureValueInput". */
export function schemaName(id: string, suffix: string): string {
  return id.split('/').map(capital).join('') + suffix;
}
