import { parseArgs } from 'node:util';

export const USAGE = `usage: npm run --silent solve -- FILE… [--json]

Finds the operating point of each circuit file; - reads standard input.

  --json   print one record a line and nothing else
  --help   print this

Exit status: 0 all solved, 1 some unsolved, 2 some invalid.
`;

export type Arguments =
  | { readonly kind: 'solve'; readonly files: readonly string[]; readonly json: boolean }
  | { readonly kind: 'help' }
  | { readonly kind: 'wrong'; readonly message: string };

/** What the command line asks for; a mistake in it is told, not thrown. */
export function readArguments(list: readonly string[]): Arguments {
  try {
    const { values, positionals } = parseArgs({
      args: [...list],
      options: { json: { type: 'boolean', default: false }, help: { type: 'boolean', default: false } },
      allowPositionals: true,
    });
    if (values.help) return { kind: 'help' };
    if (positionals.length === 0) return { kind: 'wrong', message: 'No circuit file was named.' };
    return { kind: 'solve', files: positionals, json: values.json };
  } catch (error) {
    return { kind: 'wrong', message: error instanceof Error ? error.message : String(error) };
  }
}
