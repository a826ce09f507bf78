/** Pulses, photons, beams: published values by the command line. Each row carries its source; see `one-shot-rows.ts`. */
import { checkOneShot, number } from './one-shot-rows.ts';

checkOneShot('Pulses, photons, beams', [
  {
    id: 'pulse-100fs-10mm',
    quantity: 'FWHM of a 100 fs gaussian pulse after 10 mm fused silica at 800 nm',
    unit: 'fs',
    wanted: 100.5,
    tolerance: 0.05,
    toleranceBasis: 'numerical or printed digits',
    source: 'computed',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      1e15 *
      number((await answer('vacuum fused-silica@10mm vacuum 800nm --pulse 100fs')).pulse?.durationOut_s),
  },
  {
    id: 'ph-hene5',
    quantity: 'photon flux of 5 mW at 632.8 nm',
    unit: '1e16 /s',
    wanted: 1.6,
    tolerance: 0.05,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'solved school problem',
    kind: 'published',
    fromMemory: false,
    got: async ({ answer }) =>
      1e-16 * number((await answer('air n=1.5 632.8nm --power 5mW')).energy?.photonFlux_per_s),
  },
  {
    id: 'ph-hene1',
    quantity: 'photon flux of 1 mW at 632.8 nm',
    unit: '1e15 /s',
    wanted: 3.186,
    tolerance: 0.001,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'common practice (3.2e15)',
    kind: 'common practice',
    fromMemory: true,
    got: async ({ answer }) =>
      1e-15 * number((await answer('air n=1.5 632.8nm --power 1mW')).energy?.photonFlux_per_s),
  },
  {
    id: 'pu-peak-gauss',
    quantity: 'peak power factor of a gaussian pulse',
    unit: '1',
    wanted: 0.94,
    tolerance: 0.005,
    toleranceBasis: 'numerical or printed digits',
    source: 'common practice: 0.94 E/FWHM',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('air n=1.5 1um --pulse-energy 1J --pulse 1s')).energy?.pulse?.peakPower_W),
  },
  {
    id: 'pu-gauss-I',
    quantity: 'peak intensity of 1 W in w = 1 mm',
    unit: 'W/cm^2',
    wanted: 63.66,
    tolerance: 0.005,
    toleranceBasis: 'numerical or printed digits',
    source: '2P/(pi w^2)',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      1e-4 *
      number((await answer('air n=1.5 1um --power 1W --beam 2mm')).energy?.incident?.irradiance_W_per_m2),
  },
  {
    id: 'pu-flu',
    quantity: 'peak fluence of 3 J gaussian for 5e8 W/cm^2 x 20 ns pulses: beam diameter 2w',
    unit: 'cm',
    wanted: 0.847,
    tolerance: 0.001,
    toleranceBasis: 'numerical or printed digits',
    source: 'damage-threshold problem, closed form',
    kind: 'exact',
    fromMemory: false,
    note: 'asked the other way round: the diameter given, scaled by the root of the irradiance got over the threshold',
    got: async ({ answer }) =>
      0.847 *
      Math.sqrt(
        number(
          (await answer('air n=1.5 1um --pulse-energy 3J --pulse 20ns --beam 8.47mm')).energy?.pulse
            ?.peakIrradiance_W_per_m2,
        ) / 5e12,
      ),
  },
  {
    id: 'pu-tbp',
    quantity: 'time-bandwidth product of a gaussian',
    unit: '1',
    wanted: 0.441,
    tolerance: 0.0005,
    toleranceBasis: 'numerical or printed digits',
    source: 'textbooks',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('air n=1.5 1um --pulse 1ps')).pulse?.timeBandwidthProduct),
  },
  {
    id: 'pu-tophat',
    quantity: 'fluence of 1 mJ over a top-hat of 1 mm diameter',
    unit: 'J/cm^2',
    wanted: 0.12732,
    tolerance: 5e-6,
    toleranceBasis: 'numerical or printed digits',
    source: 'E/(pi r^2)',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      1e-4 *
      number(
        (await answer('air n=1.5 1um --pulse-energy 1mJ --pulse 1ns --beam 1mm --profile flat')).energy?.pulse
          ?.peakFluence_J_per_m2,
      ),
  },
  {
    id: 'st-node',
    quantity: 'intensity maximum in front of a perfect mirror (units of the incident)',
    unit: '1',
    wanted: 4.0,
    tolerance: 1e-12,
    toleranceBasis: 'numerical or printed digits',
    source: 'standing wave',
    kind: 'exact',
    fromMemory: true,
    note: 'the perfect mirror is total reflection',
    got: async ({ answer }) =>
      number(
        (await answer('n=1.5 n=1 1um --angle 60 --pol s --irradiance 1W/m2')).energy?.fieldMaximumBefore
          ?.intensity,
      ),
  },
  {
    id: 'en-1kw',
    quantity: 'E0 of 1 kW/m^2 in vacuum',
    unit: 'V/m',
    wanted: 868,
    tolerance: 0.5,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'common practice (868 V/m peak, 614 V/m rms)',
    kind: 'common practice',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('vacuum n=1.5 1um --irradiance 1kW/m2')).energy?.incident?.peakE_V_per_m),
  },
  {
    id: 'en-gt',
    quantity: 'E0 of 1 mW over a spot of radius 6 um',
    unit: '1e4 V/m',
    wanted: 8.2,
    tolerance: 0.05,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Ghatak & Thyagarajan, Introduction to Fiber Optics, ex. 2.3',
    kind: 'published',
    fromMemory: false,
    note: 'flat-top spot',
    got: async ({ answer }) =>
      1e-4 *
      number(
        (await answer('vacuum n=1.5 1um --power 1mW --beam 12um --profile flat')).energy?.incident
          ?.peakE_V_per_m,
      ),
  },
  {
    id: 'en-kaertner',
    quantity: 'peak field of 1 MW over pi (1.5 um)^2',
    unit: '1e10 V/m',
    wanted: 1.0,
    tolerance: 0.06,
    toleranceBasis: 'half a unit of the last printed digit',
    source: 'Kaertner, Ultrafast Optics 1.2',
    kind: 'published',
    fromMemory: false,
    got: async ({ answer }) =>
      1e-10 *
      number(
        (await answer('vacuum n=1.5 1um --power 1MW --beam 3um --profile flat')).energy?.incident
          ?.peakE_V_per_m,
      ),
  },
  {
    id: 'en-glass',
    quantity: 'E0 in glass n=1.5 at 1 kW/m^2',
    unit: 'V/m',
    wanted: 708.7,
    tolerance: 0.05,
    toleranceBasis: 'numerical or printed digits',
    source: 'I = n E0^2/(2 Z0)',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('n=1.5 n=1.6 1um --irradiance 1kW/m2')).energy?.incident?.peakE_V_per_m),
  },
  {
    id: 'en-TE-cont',
    quantity: 'intensity just inside glass n=1.5 over incident intensity (T = 0.96)',
    unit: '1',
    wanted: 0.96,
    tolerance: 1e-12,
    toleranceBasis: 'numerical or printed digits',
    source: 'continuity of the Poynting vector',
    kind: 'exact',
    fromMemory: true,
    got: async ({ answer }) =>
      number((await answer('vacuum n=1.5 1um --irradiance 1W/m2')).energy?.transmitted?.irradiance_W_per_m2),
  },
]);
