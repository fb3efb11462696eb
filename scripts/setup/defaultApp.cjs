/**
 * Becomes resources/default_app.asar of a carried runtime: runs the program named on the command line,
 * as Electron's own default app does (electron [-r module]... <folder|file> [arguments]).
 */
'use strict';

const { app } = require('electron');
const fs = require('node:fs');
const Module = require('node:module');
const path = require('node:path');

const args = process.argv.slice(1);
const preloaded = [];
let target;
for (let i = 0; i < args.length && target === undefined; i++) {
  if (args[i] === '--version' || args[i] === '-v') {
    process.stdout.write(`v${process.versions.electron}\n`);
    process.exit(0);
  } else if (args[i] === '-r' || args[i] === '--require') preloaded.push(args[++i]);
  else if (!args[i].startsWith('-')) target = args[i];
}
if (target === undefined) {
  process.stderr.write('usage: electron [options] <folder|file> [arguments]\n');
  process.exit(2);
}

process.defaultApp = true;
for (const name of preloaded) Module._load(name, module, true);
const folder = path.resolve(target);
const manifest = path.join(folder, 'package.json');
let isPackage = false;
if (fs.existsSync(manifest)) {
  const facts = JSON.parse(fs.readFileSync(manifest, 'utf8'));
  isPackage = true;
  if (facts.version) app.setVersion(facts.version);
  app.name = facts.productName || facts.name || app.name;
}
try {
  const entry = Module._resolveFilename(folder, null, true);
  app.setAppPath(isPackage ? folder : path.dirname(entry));
  Module._load(entry, Module, true);
} catch (error) {
  // Electron would show a modal dialog here and wait: on a virtual display nobody could close it.
  process.stderr.write(`${error.stack}\n`);
  app.exit(1);
}
