import { EventEmitter } from 'node:events';
import { setImmediate as immediate, setTimeout as sleep } from 'node:timers/promises';
import { describe, expect, it, vi } from 'vitest';
import { keyChord } from '../../src/term/key.ts';
import { KeyStream } from '../../src/term/key-stream.ts';

class FakeInput extends EventEmitter {
  flowing = false;
  resume(): void {
    this.flowing = true;
  }
  pause(): void {
    this.flowing = false;
  }
  send(data: string | Buffer): void {
    this.emit('data', typeof data === 'string' ? Buffer.from(data) : data);
  }
}

function listen(options: ConstructorParameters<typeof KeyStream>[1] = {}) {
  const input = new FakeInput();
  const stream = new KeyStream(input, options);
  const heard: string[] = [];
  stream.onKey((key) => heard.push(keyChord(key)));
  stream.onPaste((text) => heard.push(`paste:${text}`));
  stream.start();
  return { input, stream, heard };
}

describe('keys from standard input', () => {
  it('come one by one, in the tick of their arrival', () => {
    const { input, heard } = listen();
    input.send('jj\x1b[Bµ\r');
    expect(heard).toEqual(['j', 'j', 'down', 'µ', 'enter']);
  });

  it('put characters together that are torn between their bytes', () => {
    const { input, heard } = listen();
    for (const byte of Buffer.from('µ石👍')) input.send(Buffer.of(byte));
    expect(heard).toEqual(['µ', '石', '👍']);
  });

  it('leave out bytes that are no UTF-8', () => {
    const { input, heard } = listen();
    input.send(Buffer.of(0xff, 0x61, 0xc3, 0x28, 0x62));
    expect(heard).toEqual(['a', '(', 'b']);
  });

  it('act on a lone Escape within 60 ms, and not at once', async () => {
    // Timers fire in the order of their times, however busy the machine is.
    const { input, heard } = listen();
    input.send('\x1b');
    await sleep(50);
    expect(heard).toEqual([]);
    await sleep(10);
    await immediate();
    expect(heard).toEqual(['escape']);
  });

  it.each([5, 20, 50])('take an arrow torn after ESC for %i ms as an arrow', async (gap_ms) => {
    const { input, heard } = listen();
    input.send('\x1b');
    await sleep(gap_ms - 2);
    input.send('[A');
    await sleep(200);
    expect(heard).toEqual(['up']);
  });

  it('take an arrow torn after ESC [ for 100 ms as an arrow', async () => {
    const { input, heard } = listen();
    input.send('\x1b[');
    await sleep(100);
    input.send('A');
    await sleep(200);
    expect(heard).toEqual(['up']);
  });

  it('hand a paste over whole', () => {
    const { input, heard } = listen();
    input.send('\x1b[200~633 nm\rq');
    input.send('uartz\x1b[201~q');
    expect(heard).toEqual(['paste:633 nm\nquartz', 'q']);
  });

  it('are kept until somebody listens', async () => {
    const input = new FakeInput();
    const stream = new KeyStream(input);
    stream.start();
    input.send('/sil\r');
    const heard: string[] = [];
    stream.onPaste((text) => heard.push(text));
    const stop = stream.onKey((key) => heard.push(keyChord(key)));
    expect(heard).toEqual([]);
    await Promise.resolve();
    expect(heard).toEqual(['/', 's', 'i', 'l', 'enter']);
    stop();
    input.send('x');
    stream.onKey((key) => heard.push(keyChord(key)));
    await Promise.resolve();
    expect(heard.at(-1)).toBe('x');
  });

  it('can be taken before anybody hears of them', () => {
    const taken: string[] = [];
    const { input, heard } = listen({
      intercept: (key) => {
        if (!key.ctrl) return false;
        taken.push(keyChord(key));
        return true;
      },
    });
    input.send('a\x03b\x0c');
    expect(taken).toEqual(['ctrl+c', 'ctrl+l']);
    expect(heard).toEqual(['a', 'b']);
  });

  it('end with the stream', async () => {
    const { input, stream, heard } = listen();
    input.send('\x1b');
    stream.stop();
    expect(input.flowing).toBe(false);
    input.send('x');
    await sleep(100);
    expect(heard).toEqual([]);
    expect(input.listenerCount('data')).toBe(0);
  });
});

describe('the input for Ink', () => {
  it('is a terminal that never sends anything', () => {
    const { input, stream } = listen();
    const readable = vi.fn();
    const stdin = stream.silentStdin;
    expect(stdin.isTTY).toBe(true);
    stdin.setEncoding('utf8');
    stdin.ref();
    stdin.setRawMode(true);
    stdin.addListener('readable', readable);
    input.send('abc');
    expect(readable).not.toHaveBeenCalled();
    expect(stdin.read()).toBeNull();
    stdin.removeListener('readable', readable);
    stdin.setRawMode(false);
    stdin.unref();
  });
});
