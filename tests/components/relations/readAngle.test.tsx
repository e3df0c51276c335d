import { readAngle } from '@/components/relations/readAngle';

it.each([['60', 60], ['−62.5', -62.5], ['-62,5', -62.5], [' 180° ', 180], ['+30', 30], ['.5', 0.5], ['360', 360]])('reads %p', (typed, phi) => expect(readAngle(typed)).toBe(phi));
it.each(['', 'anti', '361', '1e3', '60 70', '--6', '0x10'])('reads no angle in %p', (typed) => expect(readAngle(typed)).toBeNull());
