import path from 'node:path';
import { top } from '../setup/checkout.mjs';
import { checkImports } from './import-rules';

/** Fewer modules than this project ever had: the checker is broken, not the project clean. */
const leastModules = 100;

const { broken, unseen, seenCount } = checkImports(top, path.join(top, '.dependency-cruiser.cjs'));
for (const sentence of broken) console.error(sentence);
for (const file of unseen) console.error(`not looked at: ${file}`);
if (seenCount < leastModules) console.error(`only ${seenCount} modules were looked at`);
console.log(`${seenCount} modules, ${broken.length} imports against the rules`);
if (broken.length > 0 || unseen.length > 0 || seenCount < leastModules) process.exitCode = 1;
