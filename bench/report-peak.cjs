// Loaded before the program: writes the peak of its resident memory, in kB, into the file HALFSPACE_PEAK at its end.
'use strict';
const fs = require('node:fs');
process.on('exit', () =>
  fs.writeFileSync(process.env.HALFSPACE_PEAK, String(process.resourceUsage().maxRSS)),
);
