/**
 * A copy of `value` in which the place `path` ("geometry.spans.0.length") holds `next`; everything beside the path is
 * the same object as before, so that unchanged parts need no new rendering.
 */
export function writeAtPath<T>(value: T, path: string, next: unknown): T {
  return write(value, path.split('.'), next) as T;
}

function write(value: unknown, keys: string[], next: unknown): unknown {
  const [key, ...rest] = keys;
  if (key === undefined) return next;
  if (Array.isArray(value)) {
    const copy = [...value];
    copy[Number(key)] = write(value[Number(key)], rest, next);
    return copy;
  }
  if (typeof value === 'object' && value !== null) {
    return { ...value, [key]: write((value as Record<string, unknown>)[key], rest, next) };
  }
  throw new Error(`nothing to write at ${keys.join('.')}`);
}
