// Runs a script of this folder, after making sure that this Node can run it:
//   node scripts/require-node.mjs scripts/check.ts --json
// The syntax stays old on purpose: an old Node must be able to read this file to say what is wrong.
import module from 'module';
import path from 'path';
import url from 'url';

var needed = [22, 12];
var found = process.versions.node.split('.').map(Number);

if (found[0] < needed[0] || (found[0] === needed[0] && found[1] < needed[1])) {
  console.error(
    'Bandstead needs Node ' + needed.join('.') + ' or newer; found ' + found.slice(0, 2).join('.') + '.\n' +
    'On Linux (x64) "npm ci" brings a fitting Node along: run "npm ci", then start commands by "npm run ...".\n' +
    'Elsewhere install Node 24 from your system or from nodejs.org.'
  );
  process.exit(3);
}

var script = process.argv[2];
if (script === undefined) {
  console.error('Name a script to run, for example: node scripts/require-node.mjs scripts/check.ts');
  process.exit(2);
}
process.argv.splice(1, 2, path.resolve(script));
// Compiled modules are kept from one command to the next: half of a command's start is spared.
if (module.enableCompileCache) module.enableCompileCache(path.resolve(path.dirname(url.fileURLToPath(import.meta.url)), '..', '.cache', 'compiled'));
import(url.pathToFileURL(process.argv[1]).href).catch(function (error) {
  console.error(error);
  process.exit(3);
});
