import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isTextKey, keyChord } from '../../src/term/key.ts';
import { ESCAPE_HOLD_MS, type InputEvent, KeyParser } from '../../src/term/key-parser.ts';

const show = (event: InputEvent): string =>
  event.kind === 'paste' ? `paste:${JSON.stringify(event.text)}` : keyChord(event.key);

/** The events of pieces that come quickly one after another, and of the silence after the last. */
function events(...pieces: string[]): string[] {
  const parser = new KeyParser();
  const found = pieces.flatMap((piece) => parser.push(piece));
  if (parser.hold_ms !== null) found.push(...parser.expire());
  expect(parser.hold_ms).toBeNull();
  return found.map(show);
}

/** One sequence each: the bytes, the key. */
const SINGLE: readonly (readonly [string, string])[] = [
  ['q', 'q'],
  ['G', 'G'],
  [' ', 'space'],
  ['µ', 'µ'],
  ['石', '石'],
  ['👍', '👍'],
  ['\r', 'enter'],
  ['\n', 'enter'],
  ['\t', 'tab'],
  ['\x7f', 'backspace'],
  ['\b', 'backspace'],
  ['\x01', 'ctrl+a'],
  ['\x03', 'ctrl+c'],
  ['\x0c', 'ctrl+l'],
  ['\x1a', 'ctrl+z'],
  ['\x1c', 'ctrl+\\'],
  ['\x1f', 'ctrl+_'],
  ['\0', 'ctrl+space'],
  ['\x1bx', 'alt+x'],
  ['\x1bV', 'alt+V'],
  ['\x1bλ', 'alt+λ'],
  ['\x1b\x7f', 'alt+backspace'],
  ['\x1b\r', 'alt+enter'],
  ['\x1b\x02', 'ctrl+alt+b'],
  ['\x1b[A', 'up'],
  ['\x1b[B', 'down'],
  ['\x1b[C', 'right'],
  ['\x1b[D', 'left'],
  ['\x1bOA', 'up'],
  ['\x1bOB', 'down'],
  ['\x1bOC', 'right'],
  ['\x1bOD', 'left'],
  ['\x1b[H', 'home'],
  ['\x1b[F', 'end'],
  ['\x1bOH', 'home'],
  ['\x1bOF', 'end'],
  ['\x1b[1~', 'home'],
  ['\x1b[4~', 'end'],
  ['\x1b[7~', 'home'],
  ['\x1b[8~', 'end'],
  ['\x1b[2~', 'insert'],
  ['\x1b[3~', 'delete'],
  ['\x1b[5~', 'page-up'],
  ['\x1b[6~', 'page-down'],
  ['\x1b[Z', 'shift+tab'],
  ['\x1bOP', 'f1'],
  ['\x1bOQ', 'f2'],
  ['\x1bOR', 'f3'],
  ['\x1bOS', 'f4'],
  ['\x1b[11~', 'f1'],
  ['\x1b[15~', 'f5'],
  ['\x1b[17~', 'f6'],
  ['\x1b[21~', 'f10'],
  ['\x1b[24~', 'f12'],
  ['\x1b[[A', 'f1'],
  ['\x1b[[E', 'f5'],
  ['\x1b[1;2P', 'shift+f1'],
  ['\x1b[1;5R', 'ctrl+f3'],
  ['\x1bOM', 'enter'],
  ['\x1b[1;5C', 'ctrl+right'],
  ['\x1b[1;3D', 'alt+left'],
  ['\x1b[1;2A', 'shift+up'],
  ['\x1b[1;8B', 'ctrl+alt+shift+down'],
  ['\x1b[3;5~', 'ctrl+delete'],
  ['\x1b[5^', 'ctrl+page-up'],
  ['\x1b[3$', 'shift+delete'],
  ['\x1b[7@', 'ctrl+shift+home'],
  ['\x1b[a', 'shift+up'],
  ['\x1bOd', 'ctrl+left'],
  ['\x1b[97;5u', 'ctrl+a'],
  ['\x1b[97;2u', 'A'],
  ['\x1b[13;3u', 'alt+enter'],
  ['\x1b[27u', 'escape'],
  ['\x1b[27;5;9~', 'ctrl+tab'],
  ['\x1b[127u', 'backspace'],
];

/** What terminals send without a key. */
const SILENT: readonly (readonly [string, string])[] = [
  ['background colour', '\x1b]11;rgb:1e1e/1e1e/2e2e\x07'],
  ['background colour, closed by ST', '\x1b]11;rgb:1e1e/1e1e/2e2e\x1b\\'],
  ['clipboard', '\x1b]52;c;aGFsZnNwYWNl\x07'],
  ['device attributes', '\x1b[?62;22c'],
  ['secondary attributes', '\x1b[>41;388;0c'],
  ['terminal name', '\x1bP>|XTerm(388)\x1b\\'],
  ['setting', '\x1bP1$r0m\x1b\\'],
  ['graphics', '\x1b_Gi=31;OK\x1b\\'],
  ['focus in', '\x1b[I'],
  ['focus out', '\x1b[O'],
  ['mouse press', '\x1b[<0;33;12M'],
  ['mouse release', '\x1b[<0;33;12m'],
  ['mouse, decimal', '\x1b[32;33;12M'],
  ['mouse, oldest form', '\x1b[M !!'],
  ['cursor position', '\x1b[12;40R'],
  ['mode', '\x1b[?2026;2$y'],
  ['window size', '\x1b[8;24;80t'],
  ['status', '\x1b[0n'],
  ['keyboard flags', '\x1b[?1u'],
  ['stray end of a paste', '\x1b[201~'],
  ['unknown number', '\x1b[99~'],
  ['unknown letter', '\x1b[1;2v'],
  ['unknown console function', '\x1b[[Z'],
  ['private-use key', '\x1b[57358u'],
];

describe('single keys', () => {
  it.each(SINGLE)('%j is %s', (bytes, chord) => {
    expect(events(bytes)).toEqual([chord]);
  });

  it('knows text from commands', () => {
    const keys = ['a', 'λ', ' ', '\x01', '\x1ba', '\x1b[A'].map((bytes) => new KeyParser().push(bytes)[0]);
    const isText = keys.map((event) => event?.kind === 'key' && isTextKey(event.key));
    expect(isText).toEqual([true, true, true, false, false, false]);
  });
});

describe('replies and reports of the terminal', () => {
  it.each(SILENT)('%s gives no key', (_, bytes) => {
    expect(events(bytes)).toEqual([]);
    expect(events(`j${bytes}k`)).toEqual(['j', 'k']);
  });

  it('gives no key when it comes in two packets', () => {
    for (const [, bytes] of SILENT) {
      for (let cut = 2; cut < bytes.length; cut++) {
        expect(events(bytes.slice(0, cut), `${bytes.slice(cut)}j`)).toEqual(['j']);
      }
    }
  });
});

describe('glued keys', () => {
  it.each([
    ['jjj', ['j', 'j', 'j']],
    ['abc\r', ['a', 'b', 'c', 'enter']],
    ['\x1b[A\x1b[A', ['up', 'up']],
    ['\x1bOB\x1b[5~q', ['down', 'page-up', 'q']],
    ['\x1b[Ax\x7f', ['up', 'x', 'backspace']],
    [
      'one\r\ntwo\nthree\r',
      ['o', 'n', 'e', 'enter', 't', 'w', 'o', 'enter', 't', 'h', 'r', 'e', 'e', 'enter'],
    ],
    ['\x1b\x1b', ['escape', 'escape']],
    ['\x1b\x1bj', ['escape', 'alt+j']],
    ['\x1b\x1b[B', ['alt+down']],
    ['\x1b\x1bOB', ['alt+down']],
    ['\x1bOxy', ['alt+O', 'x', 'y']],
    ['\x1b[\rj', ['enter', 'j']],
    ['\x1b[é', ['é']],
    ['\x1b]x', ['alt+]', 'x']],
    ['\x1bPx', ['alt+P', 'x']],
    ['\u0080\ufffdx', ['x']],
  ])('%j', (bytes, chords) => {
    expect(events(bytes)).toEqual(chords);
  });

  it('let Ctrl-C and Ctrl-Z act behind an Escape, which nobody means as one key', () => {
    expect(events('\x1b\x03')).toEqual(['escape', 'ctrl+c']);
    expect(events('ab\x1b\x1b[A\x1b\x03')).toEqual(['a', 'b', 'alt+up', 'escape', 'ctrl+c']);
    expect(events('\x1b', '\x1a')).toEqual(['escape', 'ctrl+z']);
  });

  it('are one event each, also two hundred of them', () => {
    const text = 'the quick brown fox '.repeat(10);
    expect(events(text).join('')).toBe(text.replaceAll(' ', 'space'));
  });
});

describe('torn sequences', () => {
  it('come together wherever they are cut', () => {
    const whole = fc.constantFrom(...SINGLE.filter(([bytes]) => !bytes.endsWith('\r')));
    const keys = fc.array(whole, { minLength: 1, maxLength: 6 });
    fc.assert(
      fc.property(keys, fc.array(fc.nat(40), { maxLength: 5 }), (typed, cuts) => {
        const bytes = typed.map(([sequence]) => sequence).join('');
        const at = [0, ...cuts.map((cut) => Math.min(cut, bytes.length)).sort((a, b) => a - b), bytes.length];
        const pieces = at.slice(1).map((end, index) => bytes.slice(at[index], end));
        // Between the halves of one character nothing is ever cut: decoding comes first.
        fc.pre(pieces.every((piece) => !/^[\udc00-\udfff]/.test(piece)));
        expect(events(...pieces)).toEqual(typed.map(([, chord]) => chord));
      }),
      { numRuns: 1500 },
    );
  });

  it('wait as long as their start deserves', () => {
    const holds = (bytes: string): number | null => {
      const parser = new KeyParser();
      parser.push(bytes);
      return parser.hold_ms;
    };
    expect(holds('j')).toBeNull();
    expect(holds('\x1b')).toBe(ESCAPE_HOLD_MS);
    expect(ESCAPE_HOLD_MS).toBeLessThanOrEqual(60);
    expect(ESCAPE_HOLD_MS).toBeGreaterThan(50);
    expect(holds('\x1b[')).toBe(150);
    expect(holds('j\x1bO')).toBe(150);
    expect(holds('\x1b[1;')).toBe(150);
    expect(holds('\x1b]11;rgb')).toBe(1000);
    expect(holds('\x1b[200~abc')).toBe(5000);
  });

  it.each([
    ['\x1b', ['escape']],
    ['j\x1b', ['j', 'escape']],
    ['\x1b[', ['alt+[']],
    ['\x1bO', ['alt+O']],
    ['\x1b]', ['alt+]']],
    ['\x1b[1;', []],
    ['\x1b[<0;33', []],
    ['\x1b[M!', []],
    ['\x1b[[', []],
    ['\x1b]11;rgb:1e1e', []],
    ['\x1b\x1b[', ['escape', 'alt+[']],
  ])('%j alone comes out as %j', (bytes, chords) => {
    expect(events(bytes)).toEqual(chords);
  });

  it('are two presses when ESC ends one piece and starts the next', () => {
    expect(events('\x1b', '\x1b[B')).toEqual(['escape', 'down']);
    expect(events('\x1b', '\x1b')).toEqual(['escape', 'escape']);
  });

  it('do not grow without end', () => {
    expect(events(`\x1b[${'1;'.repeat(100)}`, 'j')).toEqual(['j']);
    expect(events(`\x1b]11;${'x'.repeat(5000)}`, 'j')).toEqual(['j']);
  });
});

describe('pastes', () => {
  const start = '\x1b[200~';
  const end = '\x1b[201~';

  it.each([
    ['three lines', `${start}one\rtwo\r\nthree\n${end}`, 'one\ntwo\nthree\n'],
    ['command keys', `${start}q?/jk${end}`, 'q?/jk'],
    ['nothing', `${start}${end}`, ''],
    ['tabs and units', `${start}10.6 µm\t45°${end}`, '10.6 µm\t45°'],
    ['sequences and control characters', `${start}a\x1b[31mb\x1b[mc\x03\x1bd${end}`, 'abc'],
  ])('%s come whole', (_, bytes, text) => {
    expect(events(bytes)).toEqual([`paste:${JSON.stringify(text)}`]);
  });

  it('come whole wherever they are cut, with the keys around them', () => {
    const bytes = `j${start}R = 3.4 %\r[20${end}\rk`;
    for (let first = 1; first < bytes.length; first++) {
      for (let second = first; second < bytes.length; second += 3) {
        const pieces = [bytes.slice(0, first), bytes.slice(first, second), bytes.slice(second)];
        expect(events(...pieces)).toEqual(['j', 'paste:"R = 3.4 %\\n[20"', 'enter', 'k']);
      }
    }
  });

  it('are handed over as far as they came when their end is lost', () => {
    expect(events(`${start}half of i`)).toEqual(['paste:"half of i"']);
  });
});

describe('any input', () => {
  it('neither throws nor stays held back, and no key carries a control character', () => {
    const piece = fc.string({
      unit: fc.constantFrom(
        '\x1b',
        '[',
        'O',
        ']',
        'P',
        '<',
        '?',
        ';',
        '1',
        '2',
        '0',
        '~',
        'A',
        'M',
        '\r',
        '\x07',
        '\\',
        'x',
        'λ',
        '\0',
        '\x9b',
      ),
      maxLength: 12,
    });
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 6 }), (pieces) => {
        const parser = new KeyParser();
        const found = [...pieces.flatMap((text) => parser.push(text)), ...parser.expire()];
        expect(parser.hold_ms).toBeNull();
        for (const event of found) {
          if (event.kind === 'key') expect(event.key.char ?? '').not.toMatch(/\p{Control}/u);
          if (event.kind === 'key') expect(event.key.name === 'char').toBe(event.key.char !== undefined);
        }
      }),
      { numRuns: 2500 },
    );
  });
});
