#!/usr/bin/env node
// Starts the program from its code cache where the engine accepts it (it must be the version that built it); from source otherwise.
'use strict';
const fs = require('node:fs');
const vm = require('node:vm');
const start = (name, module) => {
  const filename = `${__dirname}/${name}.js`;
  const source = fs.readFileSync(filename, 'latin1');
  let cachedData;
  try {
    cachedData = fs.readFileSync(`${__dirname}/${name}.cache`);
  } catch {}
  const script = new vm.Script(source, { filename, cachedData });
  script.runInThisContext()(require, __dirname, importPart, loadNow, module);
};
const loaded = new Map();
const loadNow = (name) => {
  let module = loaded.get(name);
  if (!module) {
    module = { exports: {} };
    loaded.set(name, module);
    start(name, module);
  }
  return module.exports;
};
// A part is either a script with a code cache of its own, or a module.
const importPart = (part) => {
  const name = part.slice(2, -4);
  return fs.existsSync(`${__dirname}/${name}.js`) ? Promise.resolve(loadNow(name)) : import(part);
};
start('core');
