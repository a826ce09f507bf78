/** How the quantities that check values are printed in are written for people: symbol and unit. */
const SYMBOLS: Readonly<Record<string, string>> = {
  n: 'n',
  k: 'k',
  R: 'R',
  eps1: "ε'",
  eps2: "ε''",
  lossTangent: 'tan δ',
  sigma_S_per_m: 'σ (S/m)',
  resistivity_ohm_m: 'ρ (Ω m)',
  skinDepth_um: 'δ (µm)',
  surfaceResistance_ohm: 'R_s (Ω)',
  alpha_per_cm: 'α (1/cm)',
  mu1: "µ'",
  mu2: "µ''",
  refractivity_1e6: '(n - 1) 10⁶',
  Vd: 'V_d',
  Ve: 'V_e',
  VD: 'V_D',
  'mean-index': 'mean n',
  'optic-angle': 'V (°)',
};

export function quantitySymbol(quantity: string): string {
  return (Object.hasOwn(SYMBOLS, quantity) ? SYMBOLS[quantity] : undefined) ?? quantity;
}
