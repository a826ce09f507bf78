/** Physical constants in SI units. Source of the measured ones: CODATA 2022 adjustment (NIST); c, h, e, k_B are exact by definition (SI Brochure, 9th ed.). */
export const SPEED_OF_LIGHT_m_per_s = 299_792_458;
export const PLANCK_J_s = 6.626_070_15e-34;
export const ELEMENTARY_CHARGE_C = 1.602_176_634e-19;
export const BOLTZMANN_J_per_K = 1.380_649e-23;
export const VACUUM_PERMITTIVITY_F_per_m = 8.854_187_8188e-12;
export const VACUUM_PERMEABILITY_N_per_A2 = 1.256_637_061_27e-6;
export const VACUUM_IMPEDANCE_ohm = 376.730_313_412;
