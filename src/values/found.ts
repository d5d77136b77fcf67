const longest = 60;

/** Says in a few words what was found, for a fault's `found`: never long, whatever a damaged file holds. */
export function describeFound(value: unknown): string {
  if (value === undefined) return 'nothing';
  if (value === null) return 'null';
  if (Array.isArray(value)) return `a list of ${value.length}`;
  if (typeof value === 'object') {
    const keys = Object.keys(value);
    return keys.length === 0 ? 'an empty object' : `an object with ${shorten(keys.slice(0, 6).join(', '))}`;
  }
  if (typeof value === 'string') return `"${shorten(value)}"`;
  if (typeof value === 'number' || typeof value === 'boolean') return String(value);
  return typeof value;
}

/** At most `longest` characters, the cut shown. */
export const shorten = (text: string): string =>
  text.length > longest ? `${text.slice(0, longest - 1)}…` : text;
