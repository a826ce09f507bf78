/** Rows of the table of commands that design a part: a crystal's cut and plates, a coating. */
import type { CommandSpec } from './command-table.ts';
import type { OptionKey } from './options.ts';

/** What states the wave, the media's conditions and the geometry, without tolerances. */
const SETTING_OPTIONS = [
  'angle_rad',
  'airWavelength',
  'temperature_K',
  'extrapolate',
  'catalog',
  'strict',
] as const satisfies readonly OptionKey[];

export const DESIGN_COMMANDS = [
  {
    name: 'coat',
    summary: 'coatings: quarter-wave films, V-coats, reflectors',
    operands: [
      { name: 'FROM', meaning: 'medium of incidence', completes: 'medium' },
      { name: 'INTO', meaning: 'medium to be coated', completes: 'medium' },
      { name: 'WAVE', meaning: '633nm, 10.6um, 282THz' },
    ],
    options: [
      ...SETTING_OPTIONS,
      'polarization',
      'limit',
      'films',
      'highFilm',
      'lowFilm',
      'pairs',
      'wantedReflectance',
      'json',
      'csv',
      'markdown',
    ],
    examples: [
      { line: 'coat air n-bk7 550nm', meaning: 'what every film of the catalogue would do' },
      {
        line: 'coat air ge 10.6um --films zns,znse --limit 1%',
        meaning: 'with materials of your choice',
      },
      {
        line: 'coat air fused-silica 633nm --reflect 99.9%',
        meaning: 'pairs for a mirror, with the spread of the process',
      },
    ],
  },
  {
    name: 'crystal',
    summary: 'a birefringent crystal: walk-off, faces, waveplates',
    operands: [
      { name: 'FROM', meaning: 'medium in front of it (default: air)', optional: true, completes: 'medium' },
      {
        name: 'CRYSTAL',
        meaning: 'key or name without an axis, or numbers: no=1.658,ne=1.486',
        completes: 'medium',
      },
      { name: 'WAVE', meaning: '633nm, 1064nm, 282THz' },
    ],
    options: [
      ...SETTING_OPTIONS,
      'cutAngle_rad',
      'cutAzimuth_rad',
      'retardance_waves',
      'thickness_m',
      'tolerances',
      'json',
      'csv',
      'markdown',
    ],
    examples: [
      { line: 'crystal calcite 633nm', meaning: 'principal axes, directions, faces, waveplates' },
      {
        line: 'crystal beta-barium-borate 532nm --cut-angle 22.8 --thickness 5mm',
        meaning: 'a plate at its cut: walk-off, retardance',
      },
      { line: 'crystal crystal-quartz 532nm --retardance quarter', meaning: 'quarter-wave plates' },
    ],
  },
] as const satisfies readonly CommandSpec[];
