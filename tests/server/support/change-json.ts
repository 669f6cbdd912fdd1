/** What a body may be made of. */
export type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };
export type Path = readonly string[];
/** A body somebody spoiled: any part of it may be anything. */
// eslint-disable-next-line @typescript-eslint/no-explicit-any -- what it looks like is what the tests are about
export type Spoiled = any;

const copy = (body: object): Spoiled => JSON.parse(JSON.stringify(body));

/** The path of every part of a body, the whole itself left out, outer ones first. Of a list its first and last. */
export function everyPlace(body: object): string[][] {
  return Object.entries(body)
    .filter((_, index, all) => !Array.isArray(body) || index === 0 || index === all.length - 1)
    .flatMap(([key, part]: [string, unknown]) => [
      [key],
      ...(typeof part === 'object' && part !== null ? everyPlace(part).map((below) => [key, ...below]) : []),
    ]);
}

/** A copy of a body with one part in another's place. */
export function withPartAt(body: object, path: Path, part: Json): Spoiled {
  const changed = copy(body);
  const last = path.at(-1) ?? '';
  let at = changed;
  for (const key of path.slice(0, -1)) at = at[key];
  at[last] = part;
  return changed;
}

/** Copies of a body, in each of which one object has a key too many: at each object's own path. */
export function unknownKeysIn(body: object): { path: string[]; body: Spoiled }[] {
  const objects = [[], ...everyPlace(body)].filter((path) => {
    let at: Spoiled = copy(body);
    for (const key of path) at = at[key];
    return typeof at === 'object' && at !== null && !Array.isArray(at);
  });
  return objects.map((path) => {
    const surprise = [...path, 'surprise'];
    return { path: surprise, body: withPartAt(body, surprise, 'of a newer version') };
  });
}
