import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { expect, it } from 'vitest';

const TOP_LEVEL = /^(shared|server|src|migrations|tests|docs|public)\/[\w./*<>-]*$/;

it.each(['README.md', 'DEVELOPERS.md'])('every path that %s names exists', (document) => {
  const text = readFileSync(document, 'utf8');
  const named = [...text.matchAll(/`([^`\n]+)`|\]\(([^)\s]+)\)/g)]
    .map((match) => match[1] ?? match[2] ?? '')
    .filter((word) => TOP_LEVEL.test(word) && !/[<*]/.test(word));
  expect(named.length).toBeGreaterThan(2);
  expect(named.filter((path) => !existsSync(path))).toEqual([]);
});

it('the generated documents are up to date', () => {
  const { status, stderr } = spawnSync('npx', ['tsx', 'server/cli/generate.ts', '--check'], {
    encoding: 'utf8',
  });
  expect(stderr).toBe('');
  expect(status).toBe(0);
});
