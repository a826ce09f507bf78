/** What a terminal sends while somebody types at random: keys glued together, torn apart, replies of the terminal in between. */
import type { Random } from './random.ts';
import { medium } from './texts.ts';

const SPECIAL = [
  '\r',
  '\x1b',
  '\t',
  '\x1b[Z',
  '\x7f',
  '\x15',
  '\x01',
  '\x05',
  '\x0b',
  '\x17',
  '\x1b[A',
  '\x1b[B',
  '\x1b[C',
  '\x1b[D',
  '\x1b[5~',
  '\x1b[6~',
  '\x1b[H',
  '\x1b[F',
  '\x1b[',
  '\x1bO',
  '\x1b[200~',
  '\x1b[201~',
  '\x1b]11;rgb:0/0/0\x07',
  '\x1b[<0;3;3M',
  '\x1b[I',
  ' ',
  '?',
  'q',
  'u',
  'y',
  '/',
];

/** One to four pieces, each as it might come in one read. */
export function keyPieces(r: Random): readonly string[] {
  return r.many(1, 4, () =>
    r.pick([
      () => String.fromCharCode(97 + r.below(26)),
      () => String.fromCharCode(32 + r.below(95)),
      () => r.pick(SPECIAL),
      () => r.pick(SPECIAL),
      () => r.number(),
      () => (r.chance(0.2) ? medium(r) : '4'),
      () => (r.chance(0.1) ? r.bytes(1 + r.below(6)).toString('latin1') : 'a'),
    ])(),
  );
}
