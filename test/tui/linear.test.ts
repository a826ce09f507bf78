import { describe, expect, it } from 'vitest';
import { beginSession, promptOf, type Reply, reply } from '../../src/tui/linear/session.ts';
import { initialState } from '../../src/tui/state.ts';
import { airToSilica, testWorld } from './helpers/stage.tsx';

const world = testWorld();

/** A conversation: what was typed, and everything that was said. */
function talk(...typed: string[]): Reply & { readonly said: string } {
  const preferences = { glyphs: 'braille', colour: false } as const;
  let last = beginSession(initialState(airToSilica(), { columns: 80, rows: 24 }, preferences, world));
  const said = [...last.lines];
  for (const line of typed) {
    last = reply(last.session, line, world);
    said.push(...last.lines);
  }
  return { ...last, said: said.join('\n') };
}

it('begins with the question, R and T, and a numbered list of what can be changed', () => {
  const { lines } = talk();
  expect(lines.join('\n')).toMatch(/Air to Fused silica.*632\.8 nm in vacuum, normal incidence, unpolarized/);
  expect(lines.join('\n')).toMatch(/\nreflectance = 3\.4598\d+\(\d+\) %\n/);
  expect(lines.filter((l) => /^\d+ .* = /.test(l)).length).toBeGreaterThan(8);
});

it('changes a value by its number, and by its name at once', () => {
  expect(talk('3', '45').said).toMatch(/angle of incidence = 45°\n.*45\.00° from the normal/);
  expect(talk('angle 45').said).toMatch(/angle of incidence = 45°/);
  expect(talk('wave 10.6um').said).toMatch(/no answer: Fused silica.*has no data/);
});

it('turns a choice by its number and says what it is now', () => {
  expect(talk('4').said).toMatch(/polarization = s polarized/);
});

it('reads out the media that match, numbered, and takes one', () => {
  const { said, session } = talk('into germ');
  expect(said).toMatch(/\d German\w+.*, n = \d\.\d+, /);
  expect(session.asking.kind).toBe('medium');
  const chosen = talk('into sapphire', '1');
  expect(chosen.said).toMatch(/second medium = Sapphire/);
});

it('takes numbers as a medium', () => {
  expect(talk('into n=1.5+0.1i').said).toMatch(/second medium = n=1\.5\+0\.1i/);
});

it('keeps what is by an empty line', () => {
  const { said, session } = talk('3', '');
  expect(said).toMatch(/angle of incidence kept/);
  expect(session.state.question.incidenceAngle_rad).toBe(0);
});

it('says what is wrong and asks again', () => {
  const { said, session } = talk('3', 'steep');
  expect(said).toMatch(/"steep" is not an angle.*write for example/);
  expect(promptOf(session)).toBe('angle of incidence: ');
  expect(talk('3', 'steep', 'quit').isOver).toBe(true);
});

it('knows its words, and says so of others', () => {
  expect(talk('fly').said).toMatch(/"fly" is no number of the list and no word known here/);
  expect(talk('help').said).toMatch(/swap or x: swap the two media/);
  expect(talk('second').said).toMatch(/refractive index = 1\.457/);
  expect(talk('sources').said).toMatch(/Malitson/);
  expect(talk('brewster').said).toMatch(/55\.54° from the normal/);
  expect(talk('swap', 'undo').session.state.question.from).toMatchObject({ material: { key: 'air' } });
  expect(talk('quit').isOver).toBe(true);
});

describe('the pages in words', () => {
  it('coat: bare surface, films with names before their numbers', () => {
    const { said } = talk('coat');
    expect(said).toMatch(/\nBare surface: R 3\.46 %\n/);
    expect(said).toMatch(/\nfilm magnesium-fluoride-film, n 1\.379\(10\), nm 114\.7, R % 1\.74, /);
  });

  it('order: every remark one sentence with its level', () => {
    const { lines } = talk('order');
    expect(lines[0]).toMatch(/^Order check: Air to Fused silica/);
    expect(lines.filter((l) => /^(look|fine|stop), [a-z ]+: /.test(l)).length).toBeGreaterThan(6);
  });

  it('compare: each value beside the name of its medium, the best named', () => {
    expect(talk('compare').said).toContain('nothing to compare yet');
    const { said } = talk('into sapphire', 'into n-bk7', 'compare');
    expect(said).toMatch(/\nR, one surface: n-bk7 4\.19\d* %, the best; sapphire:o 7\.6\d* %\n/);
    expect(said).toMatch(/\nKnoop, hardness: n-bk7 610; sapphire:o 1370, the best\n/);
  });
});

describe('what is said', () => {
  it('holds no box, braille or block character and no escape sequence', () => {
    const { said } = talk(
      'surface',
      'first',
      'second',
      'sources',
      'cautions',
      'coat',
      'order',
      'help',
      'list',
      'into si',
      'x',
    );
    expect(said).not.toMatch(/[\u2500-\u259f\u2800-\u28ff\x1b]/);
  });

  it('names every value before it', () => {
    for (const line of talk('second').lines.slice(1)) expect(line).toMatch(/^\p{L}.* = /u);
  });
});
