/** A request body while it is being filled in; the same shape that goes out to the API. */
export type Body = Readonly<Record<string, unknown>>;

/** Where a value stands in a body: names, and numbers into lists. */
export type Path = readonly (string | number)[];

type Container = Record<string | number, unknown>;

const isContainer = (value: unknown): value is Container => typeof value === 'object' && value !== null;

/** The value at a path, undefined where the path leads nowhere. */
export function valueAt(body: unknown, path: Path): unknown {
  return path.reduce<unknown>((value, part) => (isContainer(value) ? value[part] : undefined), body);
}

function copyOf(value: unknown, nextPart: string | number): Container {
  if (Array.isArray(value)) return [...(value as unknown[])] as unknown as Container;
  if (isContainer(value)) return { ...value };
  return (typeof nextPart === 'number' ? [] : {}) as Container;
}

/**
 * The body with another value at a path; undefined takes a name out, and an item out of its list. Containers
 * on the way are made where they are missing. The body itself stays as it is.
 */
export function withValueAt(body: Body, path: Path, value: unknown): Body {
  const [part, ...rest] = path;
  if (part === undefined) return (value ?? {}) as Body;
  const copy = copyOf(body, part);
  if (rest.length > 0) {
    copy[part] = withValueAt((copy[part] ?? copyOf(undefined, rest[0] as string)) as Body, rest, value);
  } else if (value === undefined && Array.isArray(copy)) copy.splice(part as number, 1);
  else if (value === undefined) delete copy[part];
  else copy[part] = value;
  return copy as Body;
}
