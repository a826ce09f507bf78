/**
 * A question about a layered path that has no answer in this physics, as an error with a code. `message` says what is
 * wrong, `remedy` what would be right; whoever shows it joins them with "; ".
 */
export type StackRefusalCode =
  | 'not-finite'
  | 'negative-thickness'
  | 'angle-out-of-range'
  | 'wavelength-not-positive'
  | 'gain-medium'
  | 'zero-permittivity'
  | 'lossy-incidence'
  | 'no-incident-wave'
  | 'mixed-polarization'
  | 'no-two-layer-coating'
  | 'not-transparent'
  | 'unreachable-reflectance'
  | 'out-of-range';

export class StackRefusal extends Error {
  readonly code: StackRefusalCode;
  readonly remedy: string;

  constructor(code: StackRefusalCode, message: string, remedy: string) {
    super(message);
    this.name = 'StackRefusal';
    this.code = code;
    this.remedy = remedy;
  }
}
