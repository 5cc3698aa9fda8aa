import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { readArguments, USAGE } from './arguments';
import { printPoint } from './print-point';
import { solveFile } from './solve-file';

const EXIT_STATUS = { solved: 0, unsolved: 1, invalid: 2 } as const satisfies Record<
  OperatingPointRecord['status'],
  number
>;

const asked = readArguments(process.argv.slice(2));
switch (asked.kind) {
  case 'help':
    process.stdout.write(USAGE);
    break;
  case 'wrong':
    process.stderr.write(`${asked.message}\n\n${USAGE}`);
    process.exitCode = 2;
    break;
  case 'solve': {
    let worst: 0 | 1 | 2 = 0;
    for (const [index, file] of asked.files.entries()) {
      const record = await solveFile(file, process.stdin);
      if (EXIT_STATUS[record.status] > worst) worst = EXIT_STATUS[record.status];
      const gap = index === 0 ? '' : '\n';
      process.stdout.write(asked.json ? `${JSON.stringify(record)}\n` : `${gap}${printPoint(file, record)}`);
    }
    process.exitCode = worst;
  }
}
