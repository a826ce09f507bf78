/**
 * Angle of the two optic axes of a biaxial crystal from its z axis: they lie in the plane of the axes with the smallest and
 * the largest index. With the indices in order a < b < c: tan^2 V = (c^2/a^2) (b^2 - a^2)/(c^2 - b^2) from the axis of c.
 * Source: Born & Wolf, Principles of Optics, 15.3.
 */
export function opticAxisAngle_rad(nx: number, ny: number, nz: number): number | null {
  const [a, b, c] = [nx, ny, nz].sort((p, q) => p - q) as [number, number, number];
  if (!(a > 0 && a < b && b < c)) return null;
  const fromLargest = Math.atan((c / a) * Math.sqrt((b * b - a * a) / (c * c - b * b)));
  if (nz === c) return fromLargest;
  // z with the smallest index is at right angles to the axis of the largest; with the middle one it is normal to the plane.
  return nz === a ? Math.PI / 2 - fromLargest : Math.PI / 2;
}
