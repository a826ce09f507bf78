#!/usr/bin/env node
// Starts the program from its code cache where the engine accepts it (it must be the version that built it); from source otherwise.
'use strict';
const fs = require('node:fs');
const vm = require('node:vm');
const file = `${__dirname}/core.js`;
let cachedData;
try {
  cachedData = fs.readFileSync(`${__dirname}/core.cache`);
} catch {}
const script = new vm.Script(fs.readFileSync(file, 'latin1'), { filename: file, cachedData });
script.runInThisContext()(require, file, (part) => import(part));
