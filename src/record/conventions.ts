/** What the signs and symbols of a record mean; goes into every record, since a year later nobody remembers. */
export const CONVENTIONS: readonly string[] = [
  'Fields vary as exp(i(k r - w t)); in n + ik, k >= 0 absorbs.',
  'n and k are relative to vacuum. Wavelengths are those in vacuum unless air is named.',
  'Angles are taken from the normal of the interface.',
  's: electric field perpendicular to the plane of incidence; p: in that plane; unpolarized: the mean of both.',
  'r_s = (n1 cos a1 - n2 cos a2)/(n1 cos a1 + n2 cos a2) and r_p = (n2 cos a1 - n1 cos a2)/(n2 cos a1 + n1 cos a2) for non-magnetic media: r_p = -r_s at normal incidence.',
  'R and T are parts of the incident power; T is what crosses the boundary. r and t are ratios of electric field amplitudes.',
  'Losses in dB are positive: reflection loss -10 log10(1 - R), return loss -10 log10(R).',
  'A depth is where the power (penetration depth) or the field (skin depth, evanescent depth) has fallen to 1/e.',
  'Figures in parentheses are the standard uncertainty of the last digits shown; it comes from the accuracy that the source states and from the tolerances given.',
];
