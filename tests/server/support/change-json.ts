/** What a body may be made of. */
export type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };
export type Path = readonly string[];

const isContainer = (part: unknown): part is object => typeof part === 'object' && part !== null;

/** The path of every part of a body, the whole itself left out, outer ones first. Of a list its first and last. */
export function everyPlace(body: object): string[][] {
  return Object.entries(body)
    .filter((_, index, all) => !Array.isArray(body) || index === 0 || index === all.length - 1)
    .flatMap(([key, part]: [string, unknown]) => [
      [key],
      ...(isContainer(part) ? everyPlace(part).map((below) => [key, ...below]) : []),
    ]);
}

/** The path of every object in a body, its own first; lists are none. */
export function everyObject(body: object): string[][] {
  return [[], ...everyPlace(body)].filter((path) => {
    const part = partAt(body, path);
    return isContainer(part) && !Array.isArray(part);
  });
}

/** What stands at a path of a body. */
export function partAt(body: unknown, path: Path): unknown {
  return path.reduce((part, key) => (isContainer(part) ? Reflect.get(part, key) : undefined), body);
}

/** A copy of a body with one part in another's place. */
export function withPartAt(body: object, path: Path, part: Json): object {
  const [key, ...rest] = path;
  if (key === undefined) throw new Error('a body has no part without a path');
  const inner: unknown = Reflect.get(body, key);
  const changed = rest.length === 0 || !isContainer(inner) ? part : withPartAt(inner, rest, part);
  return Array.isArray(body)
    ? body.map((one: unknown, index) => (String(index) === key ? changed : one))
    : { ...body, [key]: changed };
}

/** What may be sent where such a part belongs, and is none: other types, and of its own what no such part is. */
export function wrongFor(part: unknown): readonly Json[] {
  const others: readonly Json[] = [null, [], {}, [[]]];
  if (typeof part === 'string') return [...others, 7, true, '', 'no such thing', '\u0000', '\ud800'];
  if (typeof part === 'number') return [...others, '7', true, 0.5, 1e300];
  return [...others, 7, 'text', true];
}
