const MAX_LENGTH = 60;

/** A name as it may stand in an address: lower case, digits and hyphens. */
export function slugify(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')
    .toLowerCase();
  const slug = plain
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, MAX_LENGTH)
    .replace(/^-+|-+$/g, '');
  return slug || 'untitled';
}

/** The slug itself when it is free, else with the first free number behind it. */
export function freeSlug(name: string, taken: readonly string[]): string {
  const slug = slugify(name);
  if (!taken.includes(slug)) return slug;
  let number = 2;
  while (taken.includes(`${slug}-${number}`)) number += 1;
  return `${slug}-${number}`;
}
