import { soak } from './soak';
import { speed } from './speed';

/** `npm run bench`: speed, then the soak; `npm run bench -- speed` or `-- soak` for one of them. */
const [only] = process.argv.slice(2);
if (only !== 'soak') speed();
if (only !== 'speed' && !soak()) process.exitCode = 1;
