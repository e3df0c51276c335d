import { initials, placeOf, signInPath } from '@/components/shell/places';

it.each([['/', 'quick'], ['/cases', 'cases'], ['/cases/abc/history', 'cases'], ['/relations/vicinal-hh%2Fx', 'relations'], ['/team/1', 'team'], ['/reviews', 'reviews'], ['/help', undefined], ['/casesx', undefined]])(
  'marks the place of %s', (pathname, place) => expect(placeOf(pathname)).toBe(place),
);

it('leads to the sign-in page and back, inputs included', () => {
  expect(signInPath('/?j=9.6&se=0.3')).toBe('/sign-in?to=%2F%3Fj%3D9.6%26se%3D0.3');
  expect(signInPath('/sign-in?to=%2Fcases')).toBe('/sign-in');
});

it.each([['Mira Adeyemi', 'MA'], ['Rafe van den Okonjo', 'RO'], ['Łucja', 'Ł'], ['  ', '']])('shortens %p to %p', (name, short) => expect(initials(name)).toBe(short));
