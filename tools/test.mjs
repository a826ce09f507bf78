/** `npm test`: builds, then runs every test once; ends with a plain line "N passed, N failed". Further arguments go to vitest. */
import { build, runTests } from './run-tests.mjs';

if (!build()) process.exit(1);
const { status, sum } = runTests(process.execPath, process.argv.slice(2));
process.stdout.write(`${sum}\n`);
process.exitCode = status;
