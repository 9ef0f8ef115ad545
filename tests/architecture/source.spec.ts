import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { EVALUATION_LIFE_CYCLE } from '@shared/workflow/evaluation-life-cycle';
import { LASER_LIFE_CYCLE } from '@shared/workflow/laser-life-cycle';

/** Files of the tree, those not yet committed included. */
const files = execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard'], {
  encoding: 'utf8',
})
  .split('\n')
  .filter((file) => file && existsSync(file));
const sources = files.filter((file) => /\.(ts|html|scss|mjs)$/.test(file));

describe('names', () => {
  it('source files are named in kebab case, without the old type suffixes', () => {
    const odd = sources.filter((file) => {
      const name = path
        .basename(file)
        .replace(/\.(spec|harness|config|d)?\.?(ts|html|scss|mjs)$/, '');
      return (
        !/^_?[a-z0-9]+([.-][a-z0-9]+)*$/.test(name) ||
        /\.(component|service|module|pipe|directive)\.ts$/.test(file)
      );
    });
    expect(odd).toEqual([]);
  });

  it('no folder or file is a drawer for everything', () => {
    expect(sources.filter((file) => /(^|\/)(utils?|helpers?|common|misc)\//.test(file))).toEqual(
      [],
    );
    expect(sources.filter((file) => /\/(utils?|helpers?|misc)\.ts$/.test(file))).toEqual([]);
  });
});

describe('content', () => {
  it('nothing is left to do, skipped or narrowed', () => {
    const marks = [
      ['TO', 'DO'],
      ['FIX', 'ME'],
      ['coming', ' soon'],
      ['not yet', ' implemented'],
    ].map((parts) => parts.join(''));
    const pattern = new RegExp(
      `\\b(${marks.join('|')})\\b|\\b(it|test|describe)\\.(skip|only|todo)\\b`,
      'i',
    );
    expect(
      sources.filter(
        (file) =>
          file !== 'tests/architecture/source.spec.ts' && pattern.test(readFileSync(file, 'utf8')),
      ),
    ).toEqual([]);
  });

  it('only the workflow moves a state', () => {
    const server = sources.filter(
      (file) => file.startsWith('server/') && !file.endsWith('.spec.ts'),
    );
    const moves = server.filter((file) =>
      /\.set\(\s*{[^}]*\bstate:/s.test(readFileSync(file, 'utf8')),
    );
    expect(
      moves.filter(
        (file) => !file.startsWith('server/workflow/') && !file.endsWith('-repository.ts'),
      ),
    ).toEqual([]);
  });

  it('every image and font that a document or style names exists', () => {
    const missing: string[] = [];
    for (const file of files.filter((name) => /\.(md|scss)$/.test(name))) {
      const text = readFileSync(file, 'utf8');
      for (const [, target] of text.matchAll(/!\[[^\]]*\]\(([^)\s]+)\)/g)) {
        if (!existsSync(path.join(path.dirname(file), target!))) missing.push(`${file}: ${target}`);
      }
      for (const [, target] of text.matchAll(/url\(['"]?\/([^'")]+)['"]?\)/g)) {
        if (!existsSync(path.join('public', target!))) missing.push(`${file}: ${target}`);
      }
    }
    expect(missing).toEqual([]);
  });
});

describe.each([
  ['laser', LASER_LIFE_CYCLE],
  ['evaluation', EVALUATION_LIFE_CYCLE],
] as const)('the %s life cycle', (_, machine) => {
  const states: readonly string[] = machine.states;
  const steps: readonly { from: readonly string[]; to: string; event: string }[] =
    machine.transitions;

  it('names only its own states, and no step leaves a terminal one', () => {
    expect(
      steps
        .flatMap((step) => [...step.from, step.to])
        .filter((state) => state !== 'start' && !states.includes(state)),
    ).toEqual([]);
    expect(
      steps.filter((step) =>
        step.from.some((state) => (machine.terminal as readonly string[]).includes(state)),
      ),
    ).toEqual([]);
  });

  it('reaches every state from the start', () => {
    const reached = new Set(['start']);
    for (let size = 0; size !== reached.size;) {
      size = reached.size;
      for (const step of steps)
        if (step.from.some((state) => reached.has(state))) reached.add(step.to);
    }
    expect(states.filter((state) => !reached.has(state))).toEqual([]);
  });

  it('is deterministic: one step for a state and an event', () => {
    const pairs = steps.flatMap((step) => step.from.map((from) => `${from} ${step.event}`));
    expect(pairs.filter((pair, index) => pairs.indexOf(pair) !== index)).toEqual([]);
  });
});
