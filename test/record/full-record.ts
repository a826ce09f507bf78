/** A record with everything in it: films, a beam, tolerances, cautions, sources, signs that each form must escape. */
import { makeQuestion } from '../../src/answer/question.ts';
import type { Material } from '../../src/catalog/types.ts';
import { describeQuestion, type LogRecord, makeRecord } from '../../src/record/record.ts';

const material = (key: string, name: string): Material => ({
  key,
  name,
  aliases: [],
  class: 'test',
  fits: [],
});

const SILICA_SOURCE = {
  id: 'malitson-1965',
  text: 'I. H. Malitson, "Interspecimen comparison of the refractive index of fused silica", J. Opt. Soc. Am. 55, 1205-1209 (1965)',
  doi: '10.1364/josa.55.001205',
};
const FILM_SOURCE = {
  id: 'someone-1999',
  text: 'A. Müller & B. Žižka, Films of MgF₂: n_e from 5 % to 95 % [of the band], Thin Solid Films 12, 3 (1999)',
  doi: '10.1002/(sici)1097-0000(199901)27:4<175::aid-x>3.0.co;2-k',
};

const question = makeQuestion(
  { kind: 'catalogue', material: material('air', 'Air') },
  { kind: 'catalogue', material: material('sapphire', 'Sapphire'), axis: 'ordinary' },
  { wavelength_m: 632.8e-9, inAir: true, text: '632.8nm' },
  {
    layers: [
      {
        medium: { kind: 'catalogue', material: material('magnesium-fluoride', 'Magnesium fluoride') },
        thickness: { kind: 'waves', waves: 0.25 },
      },
      {
        medium: { kind: 'literal', literal: { n: { re: 1.46, im: 0 } }, text: 'n=1.46' },
        thickness: { kind: 'length', thickness_m: 10e-9 },
      },
    ],
    incidenceAngle_rad: (56.3 * Math.PI) / 180,
    polarization: 'p',
    conditions: { temperature_K: 298.15, humidity: 0.4, co2_ppm: 420 },
    beam: {
      kind: 'power',
      power_W: 5e-3,
      diameter_m: 1e-3,
      profile: 'gaussian',
      pulse: { energy_J: 2e-9, duration_s: 80e-15, repetition_Hz: 80e6 },
    },
    tolerances: { wavelength_m: 1e-9, angle_rad: (0.5 * Math.PI) / 180, index: 1e-4 },
  },
);

export const FULL_RECORD: LogRecord = makeRecord({
  ...describeQuestion(question),
  time: '2026-03-14T09:26:53+01:00',
  version: '0.1.0',
  catalogue: { hash: '0123456789ab', date: '2026-02-01' },
  commandWords: [
    ...['halfspace', 'air', 'magnesium-fluoride@0.25', 'n=1.46@10nm', 'sapphire:ordinary', '632.8nm'],
    ...['--air-wavelength', '--angle', '56.3deg', '--pol', 'p', '--temperature', '25 °C', '--power', '5mW'],
    ...['--beam', '1mm', '--tolerance', 'wave=1nm,angle=0.5deg,n=1e-4', '--note', "it's `tick` | pipe"],
  ],
  answer: {
    wave: { vacuumWavelength_m: 6.329749283618264e-7 },
    geometry: { incidenceAngle_rad: 0.9826203688728279, polarization: 'p' },
    from: { n: 1.0002765, n_uncertainty: null, k: 0, temperature_K: 298.15, fit: null },
    into: {
      n: 1.7659822471,
      n_uncertainty: 2e-5,
      k: 0,
      temperature_K: null,
      fit: { id: 'malitson-1965', source: SILICA_SOURCE, secondOpinion: { source: FILM_SOURCE, n: 1.766 } },
    },
    interface: {
      Rs: 0.2534,
      Rp: 0.000_123_456_789_012_345_67,
      R: 0.000_123_456_789_012_345_67,
      R_uncertainty: 4e-7,
      rs: { re: -0.5033885, im: 1e-17 },
    },
  },
  rows: [
    { about: 'Interface', symbol: 'R_p', label: 'reflectance', text: '0.01235(4) %' },
    { about: 'Interface', symbol: 'T_p', label: 'transmittance of the surface', text: '99.98765(4) %' },
    { about: 'Interface', symbol: 'arg r_p', label: 'phase of reflection, p', text: '-12.50°' },
    {
      about: 'Interface',
      symbol: '',
      label: 'a label that leaves no room for its value beside it',
      text: 'none',
    },
    { about: 'Sapphire, ordinary', symbol: 'n', label: 'refractive index', text: '1.76598(2)' },
    { about: 'Sapphire, ordinary', symbol: 'λ', label: 'wavelength', text: '358.43 nm' },
    {
      about: 'Sapphire, ordinary',
      symbol: 'dn/dT',
      label: 'thermo-optic coefficient',
      text: '1.3 × 10⁻⁵ K⁻¹, taken as constant from 0 °C to 60 °C and not known outside of that range',
    },
  ],
  cautions: [
    {
      code: 'stray-reflection',
      about: 'beam',
      level: 'hazard',
      text: 'Treat the reflected 0.6 µW as part of the beam; ask the laser-safety officer, and keep to the standard & local rules.',
    },
    {
      code: 'film-process',
      about: 'layer 1',
      level: 'note',
      text: 'n of a film <depends> on how it was made.',
    },
  ],
});
