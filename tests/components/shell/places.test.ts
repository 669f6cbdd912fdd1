import { isTopLevel, placeOf } from '@/components/shell/places';

test.each([
  ['/', 'today'],
  ['/jobs', 'jobs'],
  ['/jobs/new', 'jobs'],
  ['/lasers/new', 'lasers'],
  ['/crew', 'crew'],
  ['/footings/f1/outline', 'jobs'],
  ['/rounds/r1/results', 'jobs'],
  ['/jobsite', 'jobs'],
  ['/account', null],
] as const)('%s lies in %s', (pathname, place) => {
  expect(placeOf(pathname)).toBe(place);
});

test.each([
  ['/', true],
  ['/lasers', true],
  ['/account', true],
  ['/lasers/new', false],
  ['/rounds/r1/shoot', false],
])('a phone shows the tabs at %s: %s', (pathname, shown) => {
  expect(isTopLevel(pathname)).toBe(shown);
});
