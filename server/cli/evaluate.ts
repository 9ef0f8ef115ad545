import { evaluate } from '@shared/hazard/evaluate';
import { JsonElements } from './json-elements';
import { Output } from './output';

const HELP = `Evaluates laser hazard cases.

  npm run --silent evaluate < cases.json > results.json
  npm run --silent evaluate -- --bare < cases.ndjson > results.ndjson

Reads one case, an array of cases, or one case a line (NDJSON) from standard input, and writes one
result, an array or one result a line in the same order. Any number of cases streams through.

  --bare   leave out steps and candidates
  --help   print this text

A case that cannot be evaluated gives { "id", "errors": [{ "path", "message", "allowed" }] } in its
place; the others are still evaluated. The fields of cases and results: docs/engine.md.

Exit status: 0 all evaluated, 2 some cases had errors, 3 the input is not JSON, 1 wrong usage.
`;

const counts = { cases: 0, errors: 0 };

await main(process.argv.slice(2));

async function main(options: readonly string[]): Promise<void> {
  const unknown = options.find((option) => option !== '--bare' && option !== '--help');
  if (unknown !== undefined) {
    process.stderr.write(`There is no option ${unknown}; --help lists them.\n`);
    process.exitCode = 1;
  } else if (options.includes('--help')) {
    process.stdout.write(HELP);
  } else {
    await evaluateInput(options.includes('--bare'));
  }
}

async function evaluateInput(bare: boolean): Promise<void> {
  // Why: whoever reads the results may stop early, as `head` does; that is no failure.
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    process.exit(error.code === 'EPIPE' ? 0 : 1);
  });
  try {
    await answerAll(bare);
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
    process.stderr.write(`The input is not JSON: ${error.message}\n`);
    process.exitCode = 3;
    return;
  }
  if (counts.errors > 0) {
    process.stderr.write(`${counts.errors} of ${counts.cases} cases could not be evaluated\n`);
    process.exitCode = 2;
  }
}

/** Answers every case as it arrives. */
async function answerAll(bare: boolean): Promise<void> {
  const elements = new JsonElements();
  const output = new Output();
  process.stdin.setEncoding('utf8');
  for await (const text of process.stdin) {
    for (const element of elements.push(text as string)) {
      output.add(answer(element, elements, bare));
      if (output.isFull) await output.flush();
    }
  }
  for (const element of elements.end()) output.add(answer(element, elements, bare));
  if (elements.isArray) output.add(counts.cases === 0 ? '[]\n' : '\n]\n');
  await output.flush();
}

/** The result as text, with what stands before or after it. */
function answer(element: string, { isArray }: JsonElements, bare: boolean): string {
  const result = evaluate(JSON.parse(element), { bare });
  counts.cases++;
  if ('errors' in result) counts.errors++;
  const text = JSON.stringify(result);
  if (!isArray) return `${text}\n`;
  return `${counts.cases === 1 ? '[\n' : ',\n'}${text}`;
}
