/** What the numbers mean, in the few sentences that help, man page and record must state. */
export const CONVENTION_NOTES: readonly string[] = [
  'Fields are exp(i(k r - w t)); the index is n + ik, and k >= 0 absorbs.',
  'Angles are from the surface normal. s: E normal to the plane of incidence; p: E in it.',
  'r_s = (n1 cos a1 - n2 cos a2)/(n1 cos a1 + n2 cos a2), r_p = (n2 cos a1 - n1 cos a2)/(n2 cos a1 + n1 cos a2): r_p = -r_s at normal incidence.',
  'R, T are fractions of power, r, t ratios of field amplitudes; decibels of loss are positive.',
  'Wavelengths are in vacuum and indices relative to vacuum unless said otherwise. A wavenumber is 1/lambda, not 2 pi/lambda.',
  'Digits in parentheses are the standard uncertainty of the last digits shown.',
];
