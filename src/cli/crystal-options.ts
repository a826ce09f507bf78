/** Rows of the table of options (options.ts) that state how a crystal is cut and what plate is wanted of it. */
import { parseLineAngle } from '../units/parse-angle.ts';
import { parseRetardance } from '../units/parse-retardance.ts';
import { type OptionSpec, value } from './option-spec.ts';

export const CRYSTAL_OPTION_ROWS = {
  cutAngle_rad: value({
    name: 'cut-angle',
    placeholder: 'ANGLE',
    meaning: 'angle between surface normal and optic axis of the uniaxial crystal (named without an axis)',
    group: 'crystal',
    parse: parseLineAngle,
  }),
  cutAzimuth_rad: value({
    name: 'cut-azimuth',
    placeholder: 'ANGLE',
    meaning: 'angle between the plane of incidence and the plane of normal and axis: 0 or 90 off the normal',
    fallback: '0',
    group: 'crystal',
    parse: parseLineAngle,
    needs: 'cut-angle',
  }),
  retardance_waves: value({
    name: 'retardance',
    placeholder: 'WAVES',
    meaning: 'thicknesses of the plate that retards by so much: quarter, half, full or 0.25',
    group: 'crystal',
    parse: parseRetardance,
  }),
} as const satisfies Readonly<Record<string, OptionSpec>>;
