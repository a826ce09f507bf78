/** A strict little BibTeX parser for tests: entries, braced or bare values, balanced braces; throws on anything else. */
export interface BibtexEntry {
  readonly type: string;
  readonly key: string;
  readonly fields: Readonly<Record<string, string>>;
}

export function parseBibtex(text: string): readonly BibtexEntry[] {
  const entries: BibtexEntry[] = [];
  let at = 0;
  const fail = (what: string): never => {
    throw new Error(`${what} at ${at}: ${JSON.stringify(text.slice(at, at + 30))}`);
  };
  const take = (pattern: RegExp, what: string): string => {
    const match = new RegExp(pattern.source, 'y');
    match.lastIndex = at;
    const found = match.exec(text);
    if (!found) return fail(`expected ${what}`);
    at = match.lastIndex;
    return found[0];
  };
  const braced = (): string => {
    take(/\{/, 'a brace');
    const start = at;
    for (let depth = 1; ; at++) {
      const c = text[at];
      if (c === undefined) fail('unbalanced braces');
      if (c === '{') depth++;
      if (c === '}') depth--;
      if (depth === 0) break;
    }
    at++;
    return text.slice(start, at - 1);
  };
  while (at < text.length) {
    take(/\s*@/, 'an entry');
    const type = take(/[a-z]+/, 'an entry type');
    take(/\{/, 'a brace');
    const key = take(/[A-Za-z0-9:_.+-]+/, 'a key');
    const fields: Record<string, string> = {};
    while (take(/\s*[,}]/, 'a comma or the end').trim() === ',') {
      take(/\s*/, 'space');
      const name = take(/[a-z]+/, 'a field name');
      if (Object.hasOwn(fields, name)) fail(`a second field ${name}`);
      take(/\s*=\s*/, 'an equals sign');
      fields[name] = text[at] === '{' ? braced() : take(/[a-z]{3}|\d+/, 'a month or a number');
    }
    take(/\s*/, 'space');
    entries.push({ type, key, fields });
  }
  return entries;
}
