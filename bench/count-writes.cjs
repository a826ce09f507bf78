// Loaded before the program: notes every write to standard output as one character in the file HALFSPACE_WRITES.
'use strict';
const fs = require('node:fs');
const report = fs.openSync(process.env.HALFSPACE_WRITES, 'w');
const { write } = process.stdout;
process.stdout.write = function counted(...args) {
  fs.writeSync(report, '.');
  return write.apply(this, args);
};
