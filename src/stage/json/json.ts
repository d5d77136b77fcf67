export type Json = null | boolean | number | string | readonly Json[] | JsonObject;

export interface JsonObject {
  readonly [key: string]: Json;
}

export type JsonPath = readonly (string | number)[];

/** Path, as text: `parts.p3.values.resistance`, `wires.w1.ends[0]`; the file as a whole is `$`. */
export function pathText(path: readonly PropertyKey[]): string {
  if (path.length === 0) return '$';
  return path.reduce<string>((text, step) => {
    if (typeof step === 'number') return `${text}[${step}]`;
    const key = String(step);
    if (!/^[A-Za-z_][A-Za-z0-9_-]*$/.test(key)) return `${text}[${JSON.stringify(key.slice(0, 60))}]`;
    return text === '' ? key : `${text}.${key}`;
  }, '');
}

export const isObject = (value: unknown): value is JsonObject =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

/** What stands at a path; undefined where nothing does. */
export function valueAt(root: unknown, path: readonly PropertyKey[]): unknown {
  let value: unknown = root;
  for (const step of path) {
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, step)) return undefined;
    value = (value as Readonly<Record<PropertyKey, unknown>>)[step];
  }
  return value;
}
