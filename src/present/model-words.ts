/** What a fit is, in words: its formula or table, and how it takes the temperature. */
import type { Fit, Material } from '../catalog/types.ts';
import type { ModelParameters } from '../dispersion/parameters.ts';
import { honours } from '../dispersion/registry.ts';
import { formatNumber } from '../units/format-number.ts';
import type { PresentStyle } from './shown.ts';

export function modelWords(parameters: ModelParameters): string {
  switch (parameters.model) {
    case 'constant':
      return 'constant value';
    case 'sellmeier':
      return `Sellmeier formula${counted(parameters.poles, 'pole')}${counted(parameters.terms, 'further term')}`;
    case 'cauchy':
      return `Cauchy formula${counted(parameters.terms, 'term')}`;
    case 'herzberger':
      return 'Herzberger formula';
    case 'parametric-sellmeier':
      return `Sellmeier formula with coefficients that follow the ${parameters.control.kind === 'composition' ? 'composition' : 'temperature'}`;
    case 'exponential-thermal':
      return 'formula with an exponential in the temperature';
    case 'aluminium-gallium-arsenide':
      return 'band model of aluminium gallium arsenide';
    case 'gas':
      return 'dispersion of a gas, by its density';
    case 'moist-air':
      return 'dispersion of moist air';
    case 'radio-air':
      return 'radio refractivity of moist air';
    case 'oscillators':
      return 'sum of oscillators';
    case 'brendel-bormann':
      return 'sum of broadened oscillators (Brendel and Bormann)';
    case 'water-relaxation':
      return 'relaxation of water';
    case 'wideband-debye':
      return 'wideband Debye relaxation';
    case 'power-law':
      return 'power laws of the frequency';
    case 'conductor':
      return 'conductor, by its direct-current conductivity';
    case 'ice-radio':
      return 'radio permittivity of ice';
    case 'table':
      return `table${counted(parameters.at, 'row')}`;
    case 'magnetic-table':
      return 'table of permeability and permittivity';
    case 'composition-table':
      return `table over content and temperature, ${parameters.of}`;
    case 'water-optical':
      return 'formula of water over wavelength, temperature and density';
    case 'sea-water-optical':
      return 'formula of sea water over wavelength, temperature and salinity';
  }
}

function counted(list: readonly unknown[] | undefined, what: string): string {
  const count = list?.length ?? 0;
  return count === 0 ? '' : `, ${count} ${what}${count === 1 ? '' : 's'}`;
}

/** How the answer for another temperature is made from the fit. */
export function thermalWords(fit: Fit, material: Material, style: PresentStyle): string {
  if (honours(fit.parameters).includes('temperature_K')) return 'the formula takes the temperature';
  const { thermal } = fit;
  if (thermal) {
    const from = thermal.referenceTemperature_C ?? fit.temperature_C;
    const start = from === undefined ? '' : `, from ${formatNumber(from, 'shortest', style)} °C`;
    switch (thermal.form) {
      case 'constant':
        return `dn/dT = ${formatNumber(thermal.dn_dT_per_K, 'shortest', style)} /K${start}, ${thermal.range}`;
      case 'dispersive':
        return `dispersive formula of glass makers${start}, ${thermal.range}`;
      case 'wavelength-polynomial':
        return `dn/dT as a polynomial of the wavelength${start}, ${thermal.range}`;
      case 'band-edge':
        return `dn/dT from the moving band edge${start}, ${thermal.range}`;
    }
  }
  return fit.temperature_C !== undefined && material.handling?.dn_dT_1e6_per_K !== undefined
    ? 'first order, by the dn/dT of the handling facts'
    : 'not known';
}
