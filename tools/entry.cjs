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
  return script.runInThisContext()(require, __dirname, importPart, loadNow, module);
};
const loaded = new Map();
const load = (name) => {
  let part = loaded.get(name);
  if (!part) {
    part = { module: { exports: {} }, done: undefined };
    loaded.set(name, part);
    part.done = start(name, part.module);
  }
  return part;
};
const loadNow = (name) => load(name).module.exports;
// A part is either a script with a code cache of its own, which may have something to wait for, or a module.
const importPart = async (path) => {
  const name = path.slice(2, -4);
  if (!fs.existsSync(`${__dirname}/${name}.js`)) return import(path);
  const part = load(name);
  await part.done;
  return part.module.exports;
};
start('core');
