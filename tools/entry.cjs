#!/usr/bin/env node
// Starts the program from its code cache where the engine accepts it (it must be the version that built it); from source otherwise.
'use strict';
const fs = require('node:fs');
const vm = require('node:vm');
const start = (name, ...more) => {
  const file = `${__dirname}/${name}.js`;
  const source = fs.readFileSync(file, 'latin1');
  let cachedData;
  try {
    cachedData = fs.readFileSync(`${__dirname}/${name}.cache`);
  } catch {}
  new vm.Script(source, { filename: file, cachedData }).runInThisContext()(
    require,
    __dirname,
    importPart,
    ...more,
  );
};
// A part is either a script with a code cache of its own, or a module.
const importPart = (part) => {
  const name = part.slice(2, -4);
  if (!fs.existsSync(`${__dirname}/${name}.js`)) return import(part);
  const module = { exports: {} };
  start(name, module);
  return Promise.resolve(module.exports);
};
start('core');
