import { chmodSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { clipboardSequence, copyText, MAX_COPY_BYTES, screenSequence } from '../../src/term/clipboard.ts';

const decode = (sequence: string): string => {
  const match = /^\x1b\]52;c;([A-Za-z0-9+/]*={0,2})\x07$/.exec(sequence);
  if (match === null) throw new Error(`no clipboard sequence: ${JSON.stringify(sequence.slice(0, 40))}`);
  return Buffer.from(match[1] ?? '', 'base64').toString('utf8');
};

const collect = () => {
  const written: string[] = [];
  return { written, write: (sequence: string) => void written.push(sequence) };
};

const TEXT = 'R_p = 3.4794(4) % at 633 nm, λ₀ µm 20 °C\n';

describe('copying', () => {
  it('sends one plain sequence to a plain terminal', async () => {
    const { written, write } = collect();
    const result = await copyText(TEXT, { env: {}, write });
    expect(written).toHaveLength(1);
    expect(decode(written[0]!)).toBe(TEXT);
    expect(result).toEqual({
      way: 'terminal',
      message: 'Sent to your clipboard, if your terminal allows it.',
    });
  });

  it('hands the text to tmux inside tmux, and writes nothing itself', async () => {
    const { written, write } = collect();
    const loaded: string[] = [];
    const loadTmuxBuffer = async (text: string) => loaded.push(text) > 0;
    const result = await copyText(TEXT, { env: { TMUX: '/tmp/tmux-0/default,1,0' }, write, loadTmuxBuffer });
    expect(loaded).toEqual([TEXT]);
    expect(written).toEqual([]);
    expect(result.way).toBe('tmux');
    expect(result.message).toContain('if your terminal allows it');
  });

  it('sends the plain sequence where tmux does not take it', async () => {
    const { written, write } = collect();
    const env = { TMUX: 'x', STY: '1.pts' };
    const result = await copyText(TEXT, { env, write, loadTmuxBuffer: async () => false });
    expect(decode(written[0]!)).toBe(TEXT);
    expect(result.way).toBe('terminal');
  });

  it('cuts the sequence into pieces inside Screen', async () => {
    const { written, write } = collect();
    const long = TEXT.repeat(40);
    const result = await copyText(long, { env: { STY: '4242.pts-0.host' }, write });
    expect(result).toEqual({ way: 'screen', message: expect.stringContaining('if your terminal allows it') });
    expect(written).toHaveLength(1);
    const pieces = written[0]!.match(/\x1bP[\s\S]*?\x1b\\/g) ?? [];
    expect(pieces.length).toBeGreaterThan(10);
    expect(pieces.join('')).toBe(written[0]);
    for (const piece of pieces) expect(Buffer.byteLength(piece)).toBeLessThanOrEqual(204);
    expect(decode(pieces.map((piece) => piece.slice(2, -2)).join(''))).toBe(long);
  });

  it('sends what just fits, within the 100,000 bytes of xterm, and refuses more', async () => {
    const { written, write } = collect();
    const fits = 'x'.repeat(MAX_COPY_BYTES);
    expect((await copyText(fits, { env: {}, write })).way).toBe('terminal');
    expect(Buffer.byteLength(written[0]!)).toBeLessThanOrEqual(100_000);
    // Bytes count, not characters.
    const refused = await copyText('λ'.repeat(MAX_COPY_BYTES / 2 + 1), { env: {}, write });
    expect(refused.way).toBe('none');
    expect(refused.message).toContain('Not copied');
    expect(refused.message).toContain('74996');
    expect(written).toHaveLength(1);
  });

  it('never says "copied" without the condition', async () => {
    const { write } = collect();
    for (const env of [{}, { TMUX: 'x' }, { STY: 'x' }]) {
      const { message } = await copyText(TEXT, { env, write, loadTmuxBuffer: async () => true });
      expect(message).toContain('if your terminal allows it');
      expect(message).not.toMatch(/copied/i);
    }
  });

  it('has the plain sequence in the pieces', () => {
    expect(screenSequence('a')).toBe(`\x1bP${clipboardSequence('a')}\x1b\\`);
    expect(clipboardSequence('')).toBe('\x1b]52;c;\x07');
  });
});

describe('the tmux program', () => {
  let folder = '';
  const path = process.env['PATH'];
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'clipboard-'));
    process.env['PATH'] = `${folder}:${path}`;
  });
  afterEach(() => {
    process.env['PATH'] = path;
    rmSync(folder, { recursive: true });
  });
  const install = (script: string): void => {
    writeFileSync(join(folder, 'tmux'), `#!/bin/sh\n${script}\n`);
    chmodSync(join(folder, 'tmux'), 0o755);
  };

  it('gets the text on its input', async () => {
    install(`echo "$@" > ${folder}/arguments; cat > ${folder}/text`);
    const { written, write } = collect();
    expect((await copyText(TEXT, { env: { TMUX: 'x' }, write })).way).toBe('tmux');
    expect(readFileSync(join(folder, 'arguments'), 'utf8')).toBe('load-buffer -w -\n');
    expect(readFileSync(join(folder, 'text'), 'utf8')).toBe(TEXT);
    expect(written).toEqual([]);
  });

  it.each([
    ['refuses', 'exit 1'],
    ['ends without reading', 'exec 0<&-; exit 1'],
  ])('is done without where it %s', async (_, script) => {
    install(script);
    const { written, write } = collect();
    expect((await copyText('x'.repeat(70_000), { env: { TMUX: 'x' }, write })).way).toBe('terminal');
    expect(written).toHaveLength(1);
  });

  it('is done without where there is none', async () => {
    process.env['PATH'] = folder;
    const { written, write } = collect();
    expect((await copyText(TEXT, { env: { TMUX: 'x' }, write })).way).toBe('terminal');
    expect(written).toHaveLength(1);
  });
});
