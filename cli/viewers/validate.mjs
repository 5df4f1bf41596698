// usage: node validate.mjs MODULES FILE.glb...
// Runs the Khronos validator from MODULES/node_modules on each file and prints one line per file:
// errors, warnings, infos, hints, file; then every message. Exits 1 where a count is not zero.
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { resolve } from 'node:path';

const [modules, ...files] = process.argv.slice(2);
const validator = createRequire(resolve(modules, 'package.json'))('gltf-validator');
let clean = true;
for (const file of files) {
  const report = await validator.validateBytes(new Uint8Array(readFileSync(file)), {
    maxIssues: 100,
  });
  const n = report.issues;
  console.log(`${n.numErrors} errors ${n.numWarnings} warnings ${n.numInfos} infos ${n.numHints} hints ${file}`);
  for (const m of n.messages) {
    console.log(`  ${m.code} ${m.pointer}: ${m.message}`);
  }
  clean &&= n.numErrors + n.numWarnings + n.numInfos + n.numHints === 0;
}
process.exit(clean ? 0 : 1);
