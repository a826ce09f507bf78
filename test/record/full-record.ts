/**
 * A record with everything in it: films, a beam, tolerances, cautions, sources, signs that each form must escape. All of it is
 * written out, so that its forms change only where the forms do.
 */
import { type LogRecord, makeRecord } from '../../src/record/record.ts';

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

const question = {
  from: { key: 'air', axis: null, own: false },
  layers: [
    {
      medium: { key: 'magnesium-fluoride', axis: null, own: false },
      thickness: { kind: 'waves', waves: 0.25 },
    },
    {
      medium: { literal: { n: { re: 1.46, im: 0 } }, text: 'n=1.46' },
      thickness: { kind: 'length', thickness_m: 1e-8 },
    },
  ],
  into: { key: 'sapphire', axis: 'ordinary', own: false },
  wave: { wavelength_m: 6.328e-7, inAir: true, text: '632.8nm' },
  incidenceAngle_rad: 0.9826203688728075,
  polarization: 'p',
  conditions: { temperature_K: 298.15, humidity: 0.4, co2_ppm: 420 },
  tolerances: { wavelength_m: 1e-9, angle_rad: 0.008726646259971648, index: 0.0001 },
  extrapolate: false,
  beam: {
    kind: 'power',
    power_W: 0.005,
    diameter_m: 0.001,
    profile: 'gaussian',
    pulse: { energy_J: 2e-9, duration_s: 8e-14, repetition_Hz: 80000000 },
  },
  designWave: null,
  coherenceLength_m: null,
};

const asked = [
  ['medium of incidence', 'Air (air)'],
  ['layer 1', 'Magnesium fluoride (magnesium-fluoride), 0.25 wavelengths thick'],
  ['layer 2', 'n=1.46, 10 nm'],
  ['medium beyond', 'Sapphire (sapphire), ordinary'],
  ['wave', '632.8 nm in standard air, given as 632.8nm'],
  ['angle of incidence', '56.3° from the normal'],
  ['polarization', 'p'],
  ['conditions', '25 °C, 40 % relative humidity, CO2 420 × 10⁻⁶; else those of the fits'],
  ['beam', '5 mW, gaussian, diameter (1/e² of the irradiance) 1 mm, pulses of 2 nJ in 80 fs at 80 MHz'],
  ['tolerances', 'wavelength 1 nm, angle 0.5°, n beyond 0.0001 (standard uncertainties)'],
  ['outside the range of a fit', 'refused'],
  ['design wave', 'the wave above'],
].map(([label = '', text = '']) => ({ about: '', symbol: '', label, text }));

export const FULL_RECORD: LogRecord = makeRecord({
  question,
  asked,
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
