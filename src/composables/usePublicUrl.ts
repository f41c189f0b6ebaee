import { publicUrl } from '../api/publicUrl';

/** Where calls go, as the snippets name it. */
export function usePublicUrl(): string {
  return publicUrl();
}
