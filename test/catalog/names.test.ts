/** What a person may type for an entry leads to it, or to a question which one is meant; never to another entry. */
import { describe, expect, it } from 'vitest';
import { catalogueFromSources } from '../../src/catalog/from-sources.ts';
import { ENTRIES } from './catalog-files.ts';

/** Names that several entries share on purpose: the program asks. Glass codes and formulas may be shared by any number. */
const SHARED = new Set(['silicone oil', 'TOPAS', 'Topas', 'LPCVD nitride', 'cyclo-olefin polymer']);

const catalogue = catalogueFromSources();

function keysFor(text: string): readonly string[] {
  const found = catalogue.lookup(text);
  if (found.kind === 'one') return [found.found.material.key];
  return found.kind === 'several' ? found.candidates.map((m) => m.key) : [];
}

describe('names', () => {
  it('lead to their own entry, alone unless the name is known to be shared', () => {
    const bad: string[] = [];
    for (const { material: m } of ENTRIES) {
      for (const text of [m.key, m.name, ...m.aliases]) {
        const keys = keysFor(text);
        if (!keys.includes(m.key)) bad.push(`"${text}" of ${m.key} leads to ${keys.join(', ') || 'nothing'}`);
        else if (keys.length > 1 && !SHARED.has(text))
          bad.push(`"${text}" of ${m.key} is shared by ${keys.join(', ')}`);
      }
    }
    expect(bad.join('\n')).toBe('');
  });

  it('by glass code or formula report every entry that has it', () => {
    const bad: string[] = [];
    for (const { material: m } of ENTRIES)
      for (const text of [m.glassCode, m.formula])
        if (text !== undefined && !keysFor(text).includes(m.key))
          bad.push(`"${text}" of ${m.key} leads to ${keysFor(text).join(', ') || 'nothing'}`);
    expect(bad.join('\n')).toBe('');
  });

  it('repeat neither the key nor the name among the aliases', () => {
    const bare = (s: string): string => s.toLowerCase().replace(/[^a-z0-9+*%:]/g, '');
    const bad = ENTRIES.flatMap(({ material: m }) => {
      const all = [m.key, m.name, ...m.aliases].map(bare);
      return m.aliases
        .filter(
          (a) =>
            bare(a) === bare(m.key) ||
            bare(a) === bare(m.name) ||
            all.indexOf(bare(a)) !== all.lastIndexOf(bare(a)),
        )
        .map((a) => `${m.key}: ${a}`);
    });
    expect(bad).toEqual([]);
  });
});
