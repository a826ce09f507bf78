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
    options: [...CRITERIA_OPTIONS, 'sort', 'airWavelength', 'temperature_K', 'catalog', 'json', 'csv'],
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
  {
    name: 'match',
    summary: 'media beside which a target reflects least',
    operands: [
      {
        name: 'TARGET',
        meaning: 'the medium to be matched: a name or numbers, as in a question',
        completes: 'medium',
      },
      {
        name: 'CONDITION',
        meaning: 'what narrows the media, as for find: class liquid, not toxic, clear 400nm..700nm',
        optional: true,
        many: true,
      },
    ],
    options: [
      'at',
      'within',
      'mix',
      'classNames',
      'not',
      'clear_m',
      'airWavelength',
      'temperature_K',
      'catalog',
      'json',
      'csv',
    ],
    examples: [
      {
        line: 'match n-bk7 --at 589nm --class liquid',
        meaning: 'an immersion liquid, and the temperature where it fits',
      },
      { line: 'match fused-silica --at 633nm --mix --not toxic', meaning: 'mixtures of two liquids too' },
      { line: 'match n=2.4 --at 10.6um --within 0.02', meaning: 'every medium that near' },
    ],
  },
  {
    name: 'compare',
    summary: 'two to six media or parts side by side',
    operands: [
      {
        name: 'PART',
        meaning:
          'a medium, a plate of it (germanium@3mm), or a coated plate, films and plate in the order the wave meets them (FILM@qw/germanium@3mm/FILM@qw); two to six',
        many: true,
        completes: 'medium',
      },
      { name: 'WAVE', meaning: 'one or more, behind the parts', many: true },
    ],
    options: [
      'airWavelength',
      'temperature_K',
      'designWave',
      'catalog',
      'json',
      'csv',
      'markdown',
      'plot',
      'span',
      'svg',
    ],
    examples: [
      {
        line: 'compare zinc-selenide@3mm germanium@3mm kcl@3mm 10.6um',
        meaning: 'windows: loss, hardness, hazards',
      },
      {
        line: 'compare zinc-sulfide@qw/ge@3mm/zinc-sulfide@qw ge@3mm 10um',
        meaning: 'what a coating saves',
      },
      { line: 'compare n-bk7 fused-silica calcium-fluoride 400nm 1064nm', meaning: 'media at two waves' },
      {
        line: 'compare n-bk7 n-sf11 calcium-fluoride 633nm --plot wave',
        meaning: 'their dispersion as a chart',
      },
    ],
  },
  {
    name: 'order-check',
    summary: 'what to settle before a part is ordered, on one page',
    operands: [
      { name: 'FROM', meaning: 'medium before the part, mostly air', completes: 'medium' },
      {
        name: 'LAYER',
        meaning: 'the part and its films in order, MEDIUM@THICKNESS: zinc-selenide@3mm',
        optional: true,
        many: true,
        completes: 'medium',
      },
      { name: 'INTO', meaning: 'medium behind it', completes: 'medium' },
      { name: 'WAVE', meaning: 'one or more', many: true },
    ],
    options: [
      'angle_rad',
      'polarization',
      'airWavelength',
      'temperature_K',
      'designWave',
      'power_W',
      'beamDiameter_m',
      'profile',
      'catalog',
      'json',
      'markdown',
    ],
    examples: [
      { line: 'order-check air zinc-selenide@3mm air 10.6um', meaning: 'a bare window' },
      {
        line: 'order-check air zinc-selenide@3mm air 10.6um --power 30W --beam 6mm',
        meaning: 'with its beam: stray powers, heat, aperture',
      },
      {
        line: 'order-check air sapphire@2mm air 532nm 3um --markdown',
        meaning: 'for a request, at two waves',
      },
    ],
  },
] as const satisfies readonly CommandSpec[];
