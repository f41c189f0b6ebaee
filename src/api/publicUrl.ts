/** Where this service is reached, as calls name it: the console and the API share one origin. */
export function publicUrl(): string {
  return location.origin;
}
