import { describe, expect, it } from 'vitest';
import { portOf } from '../../../scripts/port.ts';
import { addressOf } from '../../../scripts/publish/address.ts';
import { aligned, counted } from '../../../scripts/report/columns.ts';
import { progressLine } from '../../../scripts/report/progress.ts';
import { duration } from '../../../scripts/report/summary.ts';
import { findChromium } from '../../../scripts/test/chromium.ts';

describe('parts of the commands', () => {
  it('an address has an origin and a base path with slashes at both ends', () => {
    expect(addressOf('https://example.org/bands')).toEqual({ origin: 'https://example.org', base: '/bands/' });
    expect(addressOf('https://example.org')).toEqual({ origin: 'https://example.org', base: '/' });
    expect(() => addressOf('example.org')).toThrow(TypeError);
  });

  it('columns line up by characters, not by code units, and lines have no blanks at the end', () => {
    expect(aligned([['β', 'x'], ['Δ − 1', '']])).toEqual(['  β      x', '  Δ − 1']);
  });

  it('counts take the right number of the noun', () => {
    expect([counted(1, 'record'), counted(0, 'record'), counted(2, 'complex', 'complexes')]).toEqual(['1 record', '0 records', '2 complexes']);
  });

  it('durations are printed in seconds and minutes', () => {
    expect([duration(40), duration(9949), duration(12_400), duration(59_700), duration(125_000)]).toEqual(['0.0 s', '9.9 s', '12 s', '60 s', '2 min 5 s']);
  });

  it('a port is a whole number up to 65535', () => {
    expect([portOf(null, 4321), portOf('0', 4321), portOf('65535', 4321)]).toEqual([4321, 0, 65535]);
    for (const typed of ['-1', '65536', '80.5', 'x', '']) expect(() => portOf(typed, 4321)).toThrow('--port');
  });

  it('progress is shown on a terminal only, and cleared in the end', () => {
    const written: string[] = [];
    const stream = (isTTY: boolean) => ({ isTTY, write: (text: string) => written.push(text) });
    const silent = progressLine('fitting', stream(false));
    silent.update(1, 2);
    silent.end();
    expect(written).toEqual([]);
    const shown = progressLine('fitting', stream(true));
    for (let done = 1; done <= 1000; done += 1) shown.update(done, 1000);
    shown.end();
    expect(written.length).toBeLessThanOrEqual(102);
    expect(written.at(-2)).toBe('\rfitting: 1000 of 1000');
    expect(written.at(-1)).toBe('\r\u001b[K');
  });

  it('a browser that is named and is not there counts as none', () => {
    expect(findChromium({ CHROME_PATH: '/nothing/here' })).toBeNull();
    expect(findChromium({ CHROME_PATH: process.execPath })).toBe(process.execPath);
  });
});
