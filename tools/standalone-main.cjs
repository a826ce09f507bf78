// Main script of the standalone executable. The program lies in it as an asset; at the first start, and where files have been
// tampered with or cleaned away since, it is unpacked into the user's cache folder, and started from there ever after.
'use strict';
const { getAsset, getRawAsset } = require('node:sea');
const { createRequire } = require('node:module');
const fs = require('node:fs');
const os = require('node:os');
const path = require('node:path');

/** { id, files: [[name, bytes], ...] }; the contents stand one after the other in the other asset, compressed. */
const list = JSON.parse(getAsset('list', 'utf8'));

const isWhole = (folder) => {
  try {
    return list.files.every(([name, size]) => fs.statSync(path.join(folder, name)).size === size);
  } catch {
    return false;
  }
};

/** In a folder that others can write to, whatever lies there may be theirs. */
const isOurs = (folder) => {
  const { uid, mode } = fs.lstatSync(folder);
  return uid === process.getuid() && (mode & 0o022) === 0;
};

const unpackInto = (folder) => {
  // Another process may be doing the same: each fills a folder of its own, and the first to rename it is the one.
  const own = fs.mkdtempSync(`${folder}.`);
  try {
    const bytes = require('node:zlib').gunzipSync(new Uint8Array(getRawAsset('files')));
    let at = 0;
    for (const [name, size] of list.files) {
      fs.writeFileSync(path.join(own, name), bytes.subarray(at, at + size));
      at += size;
    }
    if (fs.existsSync(folder) && !isWhole(folder)) fs.renameSync(folder, `${own}.old`);
    if (!isWhole(folder)) fs.renameSync(own, folder);
  } catch (error) {
    if (!isWhole(folder)) throw error;
  } finally {
    for (const rest of [own, `${own}.old`]) fs.rmSync(rest, { recursive: true, force: true });
  }
};

const homeCache = () => {
  const { XDG_CACHE_HOME } = process.env;
  return XDG_CACHE_HOME && path.isAbsolute(XDG_CACHE_HOME)
    ? XDG_CACHE_HOME
    : path.join(os.homedir(), '.cache');
};

const places = [
  () => path.join(homeCache(), 'halfspace', list.id),
  () => path.join(os.tmpdir(), `halfspace-${process.getuid()}`, list.id),
];

const findFolder = () => {
  const troubles = [];
  for (const place of places) {
    try {
      const folder = place();
      const parent = path.dirname(folder);
      fs.mkdirSync(parent, { recursive: true, mode: 0o700 });
      if (!isOurs(parent)) throw new Error(`others can write to ${parent}`);
      if (!isWhole(folder)) unpackInto(folder);
      return folder;
    } catch (error) {
      troubles.push(error.message);
    }
  }
  fs.writeSync(
    2,
    `halfspace: the program could not be unpacked (${troubles.join('; ')}); set XDG_CACHE_HOME to a folder of yours that can be written\n`,
  );
  return undefined;
};

const folder = findFolder();
if (folder === undefined) process.exitCode = 4;
else createRequire(`${folder}${path.sep}`)('./halfspace.js');
