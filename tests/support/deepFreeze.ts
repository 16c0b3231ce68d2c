/** Freezes an object and all it holds, so that a change to it throws. */
export function deepFreeze<T>(value: T): T {
  if (typeof value !== "object" || value === null) return value;
  Object.values(value).forEach(deepFreeze);
  return Object.freeze(value);
}
