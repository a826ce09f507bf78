/** Rows of the table of commands that choose among media and parts before something is ordered. */
import type { CommandSpec } from './command-table.ts';
import type { OptionKey } from './options.ts';

/** What narrows a list of media, for rows to spread. */
const CRITERIA_OPTIONS = [
  'at',
  'indexRange',
  'clear_m',
  'classNames',
  'not',
  'maxLoss',
  'thickness_m',
  'groupIndexRange',
  'gvdRange',
  'birefringenceRange',
  'abbeRange',
] as const satisfies readonly OptionKey[];

export const SELECTION_COMMANDS = [
  {
    name: 'find',
    summary: 'media by property: index, loss, clear span, class',
    operands: [
      {
        name: 'CONDITION',
        meaning:
          'words of a name, or conditions as the search box takes them: at 633nm, n 1.37..1.39, ng, gvd, dn, vd with a range, clear 3um..5um, loss 10%, thick 5mm, class liquid, not toxic',
        optional: true,
        many: true,
      },
    ],
    options: [...CRITERIA_OPTIONS, 'sort', 'airWavelength', 'catalog', 'json', 'csv'],
    examples: [
      { line: 'find --at 10.6um --clear 10.6um --not hygroscopic', meaning: 'windows for a CO2 laser' },
      {
        line: 'find --at 1064nm --max-loss 10% --thickness 5mm --class glass',
        meaning: 'by loss of a plate',
      },
      { line: 'find class liquid n 1.45..1.48 at 589nm not toxic', meaning: 'the same in the short words' },
      { line: 'find --abbe 80.. --sort -abbe --csv', meaning: 'low-dispersion glasses, for a script' },
    ],
  },
] as const satisfies readonly CommandSpec[];
