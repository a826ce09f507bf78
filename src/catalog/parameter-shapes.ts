/**
 * The shape of the parameters of every dispersion model, as `dispersion/parameters.ts` types them. The JSON Schema and
 * the check of a user's own files both come from here.
 */
import type { ModelName } from '../dispersion/parameters.ts';
import { once } from './once.ts';
import {
  either,
  list,
  nothing,
  number,
  numbers,
  oneOf,
  positive,
  record,
  type Shape,
  tagged,
  text,
} from './shape.ts';

/** By model name; made at first use. */
export const parameterShapes = once((): Readonly<Record<ModelName, Shape>> => {
  /** Coefficients of a polynomial, constant term first. */
  const polynomial = list(number(), 1);
  const any = number();
  const poleBase = { B: any };

  const pole: Shape = {
    is: 'keyed',
    cases: [
      { key: 'C_um', shape: record({ ...poleBase, C_um: any }, { numeratorPower: oneOf(0, 2) }) },
      { key: 'C_um2', shape: record({ ...poleBase, C_um2: any }, { numeratorPower: oneOf(0, 2) }) },
      { key: 'C', shape: record({ ...poleBase, C: any, numeratorPower: any, polePower: any }) },
    ],
  };
  const powerTerm = record({ c: any, power: any });

  const controlled = either(any, polynomial, record({ at0: any, at1: any }));
  const control = tagged('kind', {
    'temperature-K': record({ kind: text(), default_K: positive }),
    'temperature-K-squared': record({ kind: text(), reference_K: number({ min: 0 }), default_K: positive }),
    'temperature-product': record({ kind: text(), minus_C: any, plus_C: any, default_K: positive }),
    composition: record({ kind: text(), default: number({ min: 0, max: 1 }), of: text() }),
  });
  const controlledPole: Shape = {
    is: 'keyed',
    cases: [
      { key: 'C_um', shape: record({ B: controlled, C_um: controlled }, { numeratorPower: oneOf(0, 2) }) },
      { key: 'C_um2', shape: record({ B: controlled, C_um2: controlled }, { numeratorPower: oneOf(0, 2) }) },
    ],
  };

  const model = text();
  const withModel = (
    needs: Readonly<Record<string, Shape>>,
    may: Readonly<Record<string, Shape>> = {},
  ): Shape => record({ model, ...needs }, may);
  const withForm = (
    needs: Readonly<Record<string, Shape>>,
    may: Readonly<Record<string, Shape>> = {},
  ): Shape => record({ model, form: text(), ...needs }, may);

  const gas = (needs: Readonly<Record<string, Shape>>): Shape =>
    withForm({ reference_K: positive, reference_Pa: positive, ...needs }, { secondVirial_cm3_per_mol: any });

  const along = oneOf('L', 'L^2', 'L^-2', 'ln L', 'E');
  const column = record(
    { values: list(any, 1), along, kind: oneOf('linear', 'quadratic', 'cubic') },
    { below: record({ upTo_um: positive, along }), of: oneOf('value', 'square', 'log') },
  );

  const iceCommon = { e: numbers(2), alpha: numbers(3), default_K: positive };

  return {
    constant: withModel(
      {},
      {
        n: positive,
        k: number({ min: 0 }),
        permittivity: any,
        lossTangent: number({ min: 0 }),
        permeability: positive,
        publishedAt_um: positive,
      },
    ),
    sellmeier: withModel({ offset: any }, { poles: list(pole), terms: list(powerTerm) }),
    cauchy: withModel({ wavelengthUnit: oneOf('um', 'nm'), terms: list(powerTerm, 1) }),
    herzberger: withModel({ A: any, B: any, C: any, pole_um2: any }, { terms: list(powerTerm) }),
    'parametric-sellmeier': withModel(
      { control, offset: controlled },
      { poles: list(controlledPole), terms: list(record({ c: controlled, power: any })) },
    ),
    'exponential-thermal': withModel({
      e: polynomial,
      g: polynomial,
      xBelow: polynomial,
      xFrom: polynomial,
      switch_K: positive,
      default_K: positive,
    }),
    'aluminium-gallium-arsenide': withModel({
      x: number({ min: 0, max: 1 }),
      default_K: positive,
      A_T: polynomial,
      A_x: polynomial,
      invC0_x: polynomial,
      E1_T: polynomial,
      E1_x: polynomial,
      C1_x: polynomial,
      E0_x: polynomial,
      EG: numbers(5),
      R_GaAs: numbers(2),
      R_AlAs: numbers(2),
      eV_um: positive,
      k_eV_per_K: positive,
    }),
    gas: tagged('form', {
      refractivity: gas({ A: any, poles: list(record({ B: any, C_per_um2: any })) }),
      sellmeier: gas({ poles: list(record({ B: any, C_um2: any }), 1) }),
      cauchy: gas({ A: any, B_um2: any }),
    }),
    'moist-air': tagged('form', {
      'ciddor-1996': withForm({}),
      edlen: withForm(
        {
          dispersion: numbers(5),
          density: numbers(4),
          water: numbers(2),
          default_K: positive,
          default_Pa: positive,
        },
        { co2: record({ slope: any, reference: any }) },
      ),
    }),
    'radio-air': withModel({
      k1: any,
      k2: any,
      k3: any,
      default_K: positive,
      defaultDry_hPa: positive,
      defaultVapour_hPa: number({ min: 0 }),
    }),
    oscillators: withModel(
      { unit: oneOf('eV', 'per_cm'), epsInfinity: any },
      {
        plasma: positive,
        drude: record({ strength: any, damping: any }),
        per: oneOf('plasma', 'resonance'),
        lorentz: list(record({ strength: any, position: any, damping: any })),
      },
    ),
    'brendel-bormann': withModel({
      plasma_eV: positive,
      drude: record({ strength: any, damping_eV: any }),
      oscillators: list(record({ strength: any, position_eV: any, damping_eV: any, width_eV: any }), 1),
    }),
    'water-relaxation': tagged('form', {
      relaxations: withForm(
        {
          s: polynomial,
          a: list(any, 1),
          b: list(any, 1),
          c_s: list(any, 1),
          d_C: list(any, 1),
          tc_C: any,
          default_K: positive,
        },
        { resonances: list(record({ delta: polynomial, f_Hz: polynomial, tau_s: polynomial })) },
      ),
      'meissner-wentz': withForm(
        { es: numbers(3), a: numbers(11), default_K: positive },
        {
          salt: record({
            b: numbers(13),
            s35: polynomial,
            r: numbers(5),
            a0: numbers(5),
            a1: numbers(3),
            default_g_per_kg: number({ min: 0 }),
          }),
        },
      ),
      liebe: withForm({
        s: numbers(2),
        r: any,
        i: numbers(2),
        g_GHz: numbers(3),
        q: any,
        default_K: positive,
      }),
      'klein-swift': withForm({
        epsInfinity: any,
        es: polynomial,
        a: numbers(4),
        tau_s: polynomial,
        b: numbers(4),
        beta0: polynomial,
        beta1: polynomial,
        sigma25: polynomial,
        default_K: positive,
        default_g_per_kg: number({ min: 0 }),
      }),
    }),
    'wideband-debye': withModel({ epsInfinity: any, deltaEps: any, m1: any, m2: any, sigma_S_per_m: any }),
    'power-law': withModel({ a: any, b: any, c: any, d: any }),
    conductor: withModel(
      { sigma_S_per_m: number({ min: 0 }) },
      { permittivity: any, permeability: positive },
    ),
    'ice-radio': tagged('form', {
      maetzler: withForm({ ...iceCommon, B1: any, B2: any, b_K: any, db: numbers(2) }),
      hufford: withForm({ ...iceCommon, h: numbers(4) }),
    }),
    table: withModel(
      { abscissa: oneOf('um', 'nm', 'eV'), at: list(positive, 1), n: column },
      {
        k: column,
        alpha_per_cm: column,
        warmer: record({
          temperature_C: any,
          columns: list(record({ temperature_C: any, n: list(either(any, nothing), 1) }), 1),
        }),
      },
    ),
    'magnetic-table': withModel({
      permeability: record({ f_Hz: list(positive, 1), mu1: list(any, 1), mu2: list(any, 1) }),
      permittivity: record({ f_Hz: list(positive, 1), eps1: list(any, 1), sigma_S_per_m: list(any, 1) }),
    }),
    'composition-table': withModel({
      publishedAt_um: positive,
      content_percent: list(number({ min: 0, max: 100 }), 1),
      temperatures_C: list(any, 1),
      n: list(list(either(any, nothing), 1), 1),
      defaultComposition: number({ min: 0, max: 1 }),
      default_K: positive,
      of: text(),
    }),
    'water-optical': withModel({
      a: numbers(8),
      poleUV: any,
      poleIR: any,
      referenceTemperature_K: positive,
      referenceDensity_kg_per_m3: positive,
      referenceWavelength_um: positive,
      default_K: positive,
    }),
    'sea-water-optical': withModel({
      n: numbers(10),
      default_K: positive,
      default_g_per_kg: number({ min: 0 }),
    }),
  };
});
