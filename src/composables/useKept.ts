import { ref, watch, type Ref } from 'vue';

/** Reads what this browser keeps under a name; null where there is nothing, or storage is closed. */
export function kept(name: string): string | null {
  try {
    return localStorage.getItem(name);
  } catch {
    return null;
  }
}

export function keep(name: string, text: string): void {
  try {
    localStorage.setItem(name, text);
  } catch {
    // Storage may be closed to this page; then the address alone keeps the values.
  }
}

/** A value that this browser keeps; what is not of its shape counts as nothing. */
export function useKept<T>(name: string, read: (value: unknown) => T): Ref<T> {
  const parse = (text: string | null): unknown => {
    try {
      return JSON.parse(text ?? 'null');
    } catch {
      return null;
    }
  };
  const value = ref(read(parse(kept(name)))) as Ref<T>;
  watch(value, (next) => keep(name, JSON.stringify(next)), { deep: true });
  return value;
}
