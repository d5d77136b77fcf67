import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { run } from '../../src/cli/run.ts';

const root = new URL('../../', import.meta.url);
const read = (path: string): string => readFileSync(new URL(path, root), 'utf8');
const readme = read('README.md');

const calls = [...readme.matchAll(/^npm run --silent restpoint -- (.+)$/gm)].map(([, words = '']) => words);

describe('README.md', () => {
  it('shows calls of the command line', () => expect(calls.length).toBeGreaterThan(2));

  it.each(calls)('restpoint %s answers as it is written there', async (words) => {
    const written: string[] = [];
    let [output, errors] = ['', ''];
    const status = await run(words.split(' '), {
      readText: (path) => Promise.resolve(read(path)),
      writeFile: (path) => Promise.resolve(void written.push(path)),
      toOutput: (text) => (output += text),
      toErrors: (text) => (errors += text),
      date: '2026-01-31',
      program: 'Restpoint',
    });
    expect(errors).toBe('');
    expect(status).toBe(0);
    expect(output.length + written.length).toBeGreaterThan(0);
  });

  it('names only scripts and files that are there', () => {
    const scripts = Object.keys((JSON.parse(read('package.json')) as { scripts: object }).scripts);
    for (const [, script = ''] of [...readme.matchAll(/`npm (?:run )?([a-z:]+)`/g)])
      expect(scripts).toContain(script);
    for (const [, path = ''] of [...readme.matchAll(/\]\(([^)#]+)\)/g)]) {
      expect(() => path === 'examples' || read(path)).not.toThrow();
    }
  });
});
