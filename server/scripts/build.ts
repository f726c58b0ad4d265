import { buildAll } from './buildAll';

await buildAll();
