import 'server-only';

export type Row = Record<string, unknown>;

const camelKeys = new Map<string, string>();

/** Columns are few and rows many, so each name is worked out once. */
function camelKey(key: string): string {
  const known = camelKeys.get(key);
  if (known !== undefined) return known;
  const made = key.replace(/_([a-z0-9])/g, (_, letter: string) => letter.toUpperCase());
  camelKeys.set(key, made);
  return made;
}

function snakeKey(key: string): string {
  return key.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
}

/** Turns a database row into our own object: camelCase keys, and real booleans where `booleans` names them. */
export function fromRow<T extends object>(row: Row, booleans: readonly (keyof T & string)[] = []): T {
  const object: Row = {};
  for (const [key, value] of Object.entries(row)) object[camelKey(key)] = value;
  for (const key of booleans) object[key] = Boolean(object[key]);
  return object as T;
}

/** Turns our own object into a database row; undefined fields are left out. */
export function toRow(object: object): Row {
  const row: Row = {};
  for (const [key, value] of Object.entries(object)) {
    if (value !== undefined) row[snakeKey(key)] = value;
  }
  return row;
}
