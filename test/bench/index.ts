/** npm run bench: prints a table and writes it as JSON. Compare figures of one run only: machines are noisy. */
import { mkdirSync, writeFileSync } from 'node:fs';
import { benchBoard } from './board';
import { benchKernel } from './kernel';
import { benchLive } from './live';
import { printTable } from './report';

const rows = [...benchKernel(), ...(await benchLive()), ...(await benchBoard())];
printTable(rows);
mkdirSync('test-results', { recursive: true });
writeFileSync('test-results/bench.json', JSON.stringify({ at: new Date().toISOString(), node: process.version, rows }, null, 2));
