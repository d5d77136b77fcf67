import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readStage } from '../../../src/stage/readStage.ts';

const beacon = readFileSync(new URL('kept/version-1.stage.json', import.meta.url), 'utf8');

const codes = async (text: string): Promise<readonly string[]> => {
  const read = await readStage(text);
  return read.ok ? [] : read.faults.map(({ code, path = '' }) => `${code} ${path}`);
};

describe('a device that does not fit its part', () => {
  it('is refused with its place where the part is wired, too', async () => {
    const document = JSON.parse(beacon) as { devices: Record<string, unknown> };
    document.devices.d1 = { type: 'diode', model: { saturationCurrent: 1e-12 } };
    expect(await codes(JSON.stringify(document))).toContain('device-does-not-fit parts.p3.device');
  });

  it('and so is one that does not exist, and one that is missing', async () => {
    expect(await codes(beacon.replace('"device": "d1"', '"device": "d9"'))).toContain(
      'no-such-device parts.p3.device',
    );
    expect(
      (await codes(beacon.replace('"device": "d1", ', ''))).some((code) => code.endsWith(' parts.p3.device')),
    ).toBe(true);
  });
});
