import { fileURLToPath } from 'node:url';
import { checkLayers } from './layers.js';

const { modules, dependencies, violations } = await checkLayers(fileURLToPath(new URL('../..', import.meta.url)));
for (const violation of violations) console.error(violation);
console.log(`layers: ${modules} modules, ${dependencies} imports, ${violations.length} violations`);
if (modules === 0 || dependencies === 0) {
  console.error('layers: nothing was looked at, so nothing was checked');
  process.exitCode = 1;
}
if (violations.length > 0) process.exitCode = 1;
