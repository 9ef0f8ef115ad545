import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import prettier from 'prettier';
import { generatedDocuments } from './generated-documents';

/** `npm run generate` writes the generated documents; with `--check` it only says which are out of date. */
async function main(): Promise<void> {
  const check = process.argv.includes('--check');
  const outdated: string[] = [];
  for (const { file, text } of generatedDocuments()) {
    const options = await prettier.resolveConfig(file);
    const formatted = await prettier.format(text, { ...options, filepath: file });
    if (check) {
      if (readFileSync(file, 'utf8') !== formatted) outdated.push(file);
    } else {
      mkdirSync(path.dirname(file), { recursive: true });
      writeFileSync(file, formatted);
    }
  }
  if (outdated.length > 0) {
    console.error(`Out of date, run "npm run generate": ${outdated.join(', ')}`);
    process.exitCode = 1;
  }
}

await main();
