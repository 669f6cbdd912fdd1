import { catalogues, type Family } from '@/hooks/i18n/catalogues';
import { chooseLanguage } from '@/hooks/i18n/i18n';
import { ERROR_STATUS } from '@/shared/error-codes';

type Tree = { [key: string]: string | Tree };

function leaves(tree: Tree, path = ''): [string, string][] {
  return Object.entries(tree).flatMap(([key, value]) =>
    typeof value === 'string' ? [[`${path}${key}`, value] satisfies [string, string]] : leaves(value, `${path}${key}.`),
  );
}

const places = (text: string) => [...text.matchAll(/\{\{\s*(\w+)[^}]*\}\}/g)].map((match) => match[1] ?? '').sort();
const tags = (text: string) => [...text.matchAll(/<\/?(\w+)\s*\/?>/g)].map((match) => match[0]).sort();
const families = Object.keys(catalogues.en).filter((name): name is Family => name in catalogues.es);

test('both languages have the same screen families', () => {
  expect(Object.keys(catalogues.es)).toEqual(Object.keys(catalogues.en));
});

describe.each(families)('%s', (family) => {
  const en = leaves(catalogues.en[family]);
  const es = new Map(leaves(catalogues.es[family]));

  test('has the same keys in English and Spanish', () => {
    expect([...es.keys()].sort()).toEqual(en.map(([key]) => key).sort());
  });

  test('puts the same names into each sentence in both, and the same elements', () => {
    const differing = en.filter(([key, text]) => {
      const other = es.get(key) ?? '';
      return places(text).join() !== places(other).join() || tags(text).join() !== tags(other).join();
    });
    expect(differing).toEqual([]);
  });

  test('leaves no sentence empty, shouts nothing and says no "Oops"', () => {
    const bad = [...en, ...es].filter(([, text]) => text.trim() === '' || /[!¡]|\boops\b/i.test(text));
    expect(bad).toEqual([]);
  });
});

test('every way in which the server refuses has its sentence', () => {
  expect(Object.keys(ERROR_STATUS).filter((code) => !(code in catalogues.en.errors))).toEqual([]);
});

test.each([
  [['es-MX', 'en-US'], 'es'],
  [['en-GB'], 'en'],
  [['fr-CA', 'es'], 'es'],
  [['fr'], 'en'],
  [[], 'en'],
])('a phone that asks for %j is spoken to in %s', (asked, language) => {
  expect(chooseLanguage(asked)).toBe(language);
});
