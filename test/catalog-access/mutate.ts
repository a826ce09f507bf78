/** Arbitrary damage to JSON values and texts, for tests that nothing of it makes a reader fall over. */
import fc from 'fast-check';

/** A copy of the value with a few changes at random places: values replaced, keys or items dropped, keys renamed. */
export function damagedJson(value: unknown): fc.Arbitrary<unknown> {
  const change = fc.record({
    where: fc.nat(10_000),
    how: fc.constantFrom('replace', 'drop', 'rename', 'duplicate'),
    by: fc.oneof(
      fc.jsonValue({ maxDepth: 2 }),
      fc.constantFrom<unknown>(
        -1,
        0,
        Number.POSITIVE_INFINITY,
        '',
        '\u001b[2J',
        null,
        [],
        {},
        'A',
        'isotropic',
        1e-300,
      ),
    ),
  });
  return fc.array(change, { minLength: 1, maxLength: 3 }).map((changes) => {
    const copy = structuredClone(value);
    for (const { where, how, by } of changes) {
      const places = placesOf(copy);
      const place = places[where % places.length];
      if (!place) continue;
      const { holder, key } = place;
      if (how === 'replace') holder[key] = structuredClone(by);
      else if (how === 'drop') {
        if (Array.isArray(holder)) holder.splice(Number(key), 1);
        else delete holder[key];
      } else if (how === 'rename' && !Array.isArray(holder)) {
        holder[`${key}x`] = holder[key];
        delete holder[key];
      } else if (Array.isArray(holder)) holder.push(structuredClone(holder[Number(key)]));
    }
    return copy;
  });
}

interface Place {
  readonly holder: Record<string, unknown>;
  readonly key: string;
}

function placesOf(value: unknown): Place[] {
  if (typeof value !== 'object' || value === null) return [];
  const holder = value as Record<string, unknown>;
  return Object.keys(holder).flatMap((key) => [{ holder, key }, ...placesOf(holder[key])]);
}

/** A text with some characters dropped, doubled or replaced. */
export function damagedText(text: string): fc.Arbitrary<string> {
  const change = fc.record({
    at: fc.nat(Math.max(0, text.length - 1)),
    length: fc.integer({ min: 0, max: 12 }),
    by: fc.oneof(
      fc.string({ maxLength: 4 }),
      fc.constantFrom('\n', '\r', ',', '\u001b', '\u0000', '"', '-', 'NaN', '{', '\ufeff'),
    ),
  });
  return fc
    .array(change, { minLength: 1, maxLength: 5 })
    .map((changes) =>
      changes.reduce((t, { at, length, by }) => t.slice(0, at) + by + t.slice(at + length), text),
    );
}
