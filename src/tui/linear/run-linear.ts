/** placeholder */
import type { Start } from '../main.tsx';
export async function runLinear(start: Start): Promise<number> {
  start.host.warn('');
  return 0;
}
