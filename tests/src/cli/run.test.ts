import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { run } from '../../../src/cli/run.ts';

const beacon = readFileSync(new URL('../stage/kept/version-1.stage.json', import.meta.url), 'utf8');

/** Runs a command on files that exist only here. */
const command = async (
  words: readonly string[],
  files: Readonly<Record<string, string>> = { 'a.stage.json': beacon },
) => {
  let [output, errors] = ['', ''];
  const written = new Map<string, string | Uint8Array>();
  const status = await run(words, {
    readText: (path) => {
      const text = files[path];
      return text === undefined
        ? Promise.reject(Object.assign(new Error('ENOENT: …'), { code: 'ENOENT' }))
        : Promise.resolve(text);
    },
    writeFile: (path, content) => {
      if (path.startsWith('/full/'))
        return Promise.reject(Object.assign(new Error('ENOSPC: …'), { code: 'ENOSPC' }));
      written.set(path, content);
      return Promise.resolve();
    },
    toOutput: (text) => (output += text),
    toErrors: (text) => (errors += text),
    date: '2026-01-31',
    program: 'Restpoint 9.9.9',
  });
  return { status, output, errors, written };
};

interface Stated {
  readonly parts: Record<string, { values?: Record<string, unknown> }>;
  readonly wires: Record<string, unknown>;
}

const changed = (change: (document: Stated) => void): string => {
  const document = JSON.parse(beacon) as Stated;
  change(document);
  return JSON.stringify(document);
};

describe('settle', () => {
  it('prints every state as text, with nothing on standard error, status 0', async () => {
    const { status, output, errors } = await command(['settle', 'a.stage.json']);
    expect(status).toBe(0);
    expect(errors).toBe('');
    expect(output).toContain('Beacon lamp driver');
    expect(output).toMatch(/state on: settled in \d+ steps, direct/);
    expect(output).toMatch(/Q1 +triode +conduct +held +1\.958 V +5\.000 V +185\.7 mV +49\.23 mA/);
    expect(output).toMatch(/state off/);
    expect(output).toMatch(/Q1 +cutoff +block +held/);
  });

  it('keeps to 80 columns', async () => {
    const { output } = await command(['settle', 'a.stage.json']);
    const long = output.split('\n').filter((line) => Array.from(line).length > 80);
    expect(long).toEqual([]);
  });

  it('prints JSON of the readings, and only the state named', async () => {
    const { status, output } = await command(['settle', 'a.stage.json', '--json', '--state', 'off']);
    const readings = JSON.parse(output) as { format: string; states: Record<string, unknown> };
    expect(status).toBe(0);
    expect(readings.format).toBe('restpoint-readings');
    expect(Object.keys(readings.states)).toEqual(['off']);
  });

  it('ends with 1 where a duty is missed', async () => {
    const low = changed((document) => {
      document.parts.p5 = { ...document.parts.p5, values: { voltage: 1 } };
    });
    const { status, output } = await command(['settle', 'a.stage.json', '--state', 'on'], {
      'a.stage.json': low,
    });
    expect(output).toMatch(/Q1 .*missed/);
    expect(status).toBe(1);
  });

  it('ends with 3 where the circuit cannot be settled, and says what it concerns', async () => {
    const shorted = changed((document) => {
      document.wires.w9 = {
        ends: [
          ['p1', 'node'],
          ['p6', 'node'],
        ],
      };
    });
    const { status, output } = await command(['settle', 'a.stage.json'], { 'a.stage.json': shorted });
    expect(status).toBe(3);
    expect(output).toMatch(/not settled/);
    expect(output).toMatch(/VBAT/);
  });
});

describe('what is wrong goes to standard error with status 2', () => {
  it.each([
    ['a verb that is none', ['dance', 'a.stage.json'], /no verb "dance"; there are settle, plate/],
    [
      'a file that is none',
      ['settle', 'b.stage.json'],
      /b\.stage\.json: cannot be read: there is no such file/,
    ],
    ['an option that is none', ['settle', 'a.stage.json', '--loud'], /no option --loud; it takes/],
    [
      'a state that is none',
      ['settle', 'a.stage.json', '--state', 'dusk'],
      /no state "dusk"; there are on, off/,
    ],
    ['a temperature that is none', ['settle', 'a.stage.json', '--ambient', 'warm'], /--ambient/],
    ['a picture of another kind', ['plate', 'a.stage.json', '--out', 'a.bmp'], /\.svg or \.png/],
    ['a full disk', ['plate', 'a.stage.json', '--out', '/full/a.svg'], /cannot be written: the disk is full/],
  ])('%s', async (_, words, said) => {
    const { status, output, errors } = await command(words);
    expect(status).toBe(2);
    expect(output).toBe('');
    expect(errors).toMatch(said);
    expect(errors).not.toMatch(/\n\s+at /);
  });

  it('broken JSON, with line and column', async () => {
    const { status, errors } = await command(['settle', 'a'], { a: '{\n  "format": ,\n}' });
    expect(status).toBe(2);
    expect(errors).toMatch(/line 2, column 13/);
  });

  it('a value out of range, with its path, what was found and what is allowed', async () => {
    const wrong = changed((document) => {
      document.parts.p2 = { ...document.parts.p2, values: { resistance: -240 } };
    });
    const { status, errors } = await command(['settle', 'a'], { a: wrong });
    expect(status).toBe(2);
    expect(errors).toMatch(/parts\.p2\.values\.resistance/);
    expect(errors).toMatch(/-240/);
    expect(errors).toMatch(/1 mΩ/);
  });
});

describe('plate', () => {
  it('writes SVG to standard output where no file is named', async () => {
    const { status, output } = await command(['plate', 'a.stage.json']);
    expect(status).toBe(0);
    expect(output).toMatch(/^<svg /);
    for (const text of ['Beacon lamp driver', 'Q1', '49.23 mA', 'Restpoint 9.9.9', '2026-01-31']) {
      expect(output).toContain(text);
    }
  });

  it('writes a PNG at four times the size of one at 1', async () => {
    const size = async (scale: string) => {
      const { written } = await command(['plate', 'a.stage.json', '--out', 'a.png', '--scale', scale]);
      const content = written.get('a.png');
      if (!(content instanceof Uint8Array)) throw new Error('no picture');
      // Width and height stand in the header of a PNG (ISO/IEC 15948), after its signature and the chunk's own head.
      const view = new DataView(content.buffer, content.byteOffset);
      return [view.getUint32(16), view.getUint32(20)] as const;
    };
    const [width, height] = await size('1');
    expect(await size('4')).toEqual([4 * width, 4 * height]);
  });

  it('draws in the theme and the state that are asked for', async () => {
    const light = await command(['plate', 'a.stage.json']);
    const dark = await command(['plate', 'a.stage.json', '--theme', 'dark', '--state', 'off']);
    expect(light.output).toContain('#FAFBFC');
    expect(dark.output).toContain('#13171B');
    expect(dark.output).toContain('cutoff');
  });
});

describe('help', () => {
  it('is printed without a verb, and for one', async () => {
    expect((await command([])).output).toMatch(/VERB FILE/);
    const { status, output } = await command(['settle', '--help']);
    expect(status).toBe(0);
    expect(output).toMatch(/--ambient/);
  });
});
