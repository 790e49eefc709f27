import { describe, expect, it } from 'vitest';
import type { SweepAxis } from './run.ts';
import {
  ResultFormatError,
  decodeResult,
  describeResult,
  encodeResultHeader,
  resultByteLength,
} from './resultFormat.ts';
import type { ResultHeader } from './resultFormat.ts';

const axis = { kind: 'angle', from: 0, to: 80, points: 5, spacing: 'linear' } as const;
const header = describeResult({ axis }, ['rotationP', 'reflectanceS'], {
  solverVersion: '1.0.0',
  inputSha256: 'ab'.repeat(32),
});
const secondAxis: SweepAxis = { kind: 'wavelength', from: 400, to: 800, points: 3, spacing: 'linear' };
const family: SweepAxis = { kind: 'repeat', blockId: 'b', from: 1, to: 3, points: 2, spacing: 'linear' };
const columns = [
  [0, 20, 40, 60, 80],
  [0.1, -0.25, NaN, 1e-300, Math.PI],
  [0.5, 0.6, 0.7, 0.8, 0.9],
];

function fileOf(used: ResultHeader = header, values = columns): ArrayBuffer {
  const head = encodeResultHeader(used);
  const bytes = new Uint8Array(head.length + values.flat().length * 8);
  bytes.set(head);
  bytes.set(new Uint8Array(Float64Array.from(values.flat()).buffer), head.length);
  return bytes.buffer;
}

function changed(position: number, byte: number): ArrayBuffer {
  const file = fileOf();
  new Uint8Array(file)[position] = byte;
  return file;
}

describe('result format', () => {
  it('gives back every bit of the columns, under their names', () => {
    const result = decodeResult(fileOf());
    expect(result.header).toEqual(header);
    expect(result.header.readings).toEqual([
      { name: 'rotationP', unit: 'deg' },
      { name: 'reflectanceS', unit: '1' },
    ]);
    expect([...result.axis]).toEqual(columns[0]);
    expect([...result.columns.rotationP!]).toEqual(columns[1]);
    expect([...result.columns.reflectanceS!]).toEqual(columns[2]);
    expect(result.columns.rotationS).toBeUndefined();
  });

  it('starts the columns on an 8-byte border whatever the header says', () => {
    for (const solverVersion of ['1', '1.0', '1.0.0', '1.0.0-β', '1.0.0+1234']) {
      const used = { ...header, solverVersion };
      expect(encodeResultHeader(used).length % 8).toBe(0);
      expect(decodeResult(fileOf(used)).header.solverVersion).toBe(solverVersion);
      expect(resultByteLength(used)).toBe(fileOf(used).byteLength);
    }
  });

  it('refuses what is not a result, naming what stands there', () => {
    expect(() => decodeResult(new ArrayBuffer(3))).toThrow(/at least 16 bytes, got 3/);
    expect(() => decodeResult(new TextEncoder().encode('{"error": {"code": "gone"}}').buffer)).toThrow(
      /7b 22 65/,
    );
    expect(() => decodeResult(changed(8, 9))).toThrow(/knows the formats 1 and 2, got format 9/);
    expect(() => decodeResult(changed(12, 3))).toThrow(/multiple of 8 bytes within \d+, got 259/);
    expect(() => decodeResult(changed(15, 0x7f))).toThrow(/within \d+, got 21\d+/);
    expect(() => decodeResult(changed(16, 0x58))).toThrow(/not JSON: X/);
  });

  it('refuses a file that is cut off, too long or shifted', () => {
    const file = fileOf();
    expect(() => decodeResult(file.slice(0, -8))).toThrow(
      new RegExp(`has ${file.byteLength} bytes, got ${file.byteLength - 8}`),
    );
    const longer = new Uint8Array(file.byteLength + 8);
    longer.set(new Uint8Array(file));
    expect(() => decodeResult(longer.buffer)).toThrow(ResultFormatError);
    const shifted = columns.map((column) => [...column.slice(1), column[0]!]);
    expect(() => decodeResult(fileOf(header, shifted))).toThrow(/must be 0 at point 0, got 20/);
  });

  it('refuses a header whose parts disagree or are unknown', () => {
    expect(() => decodeResult(fileOf({ ...header, pointCount: 4 }))).toThrow(/5 points, but pointCount is 4/);
    const unknown = JSON.parse(JSON.stringify(header).replace('rotationP', 'rotationX')) as ResultHeader;
    expect(() => decodeResult(fileOf(unknown))).toThrow(/readings\.0\.name/);
  });

  it('carries every axis of a map with a family, first axis innermost', () => {
    const map = { axis: { ...axis, points: 2 }, second: secondAxis, family };
    const used = describeResult(map, ['rotationP'], { solverVersion: '1', inputSha256: 'ab' });
    expect(used).toMatchObject({ pointCount: 12, axisUnit: 'deg', secondUnit: 'nm', familyUnit: '1' });
    const values = Array.from({ length: 12 }, (_, index) => index / 7);
    const file = fileOf(used, [[0, 80], [400, 600, 800], [1, 3], values]);
    expect(file.byteLength).toBe(resultByteLength(used));
    const result = decodeResult(file);
    expect([...result.second!]).toEqual([400, 600, 800]);
    expect([...result.family!]).toEqual([1, 3]);
    expect([...result.columns.rotationP!]).toEqual(values);
    expect(new DataView(file).getUint32(8, true)).toBe(2);
    expect(() => decodeResult(fileOf(used, [[0, 80], [400, 600, 801], [1, 3], values]))).toThrow(
      /axis must be 800 at point 2, got 801/,
    );
    expect(() => decodeResult(fileOf({ ...used, pointCount: 6 }, [[0, 80]]))).toThrow(
      /axes have 12 points, but pointCount is 6/,
    );
  });

  it('stays what it was for one axis, so that stored files are read', () => {
    expect(new DataView(fileOf()).getUint32(8, true)).toBe(1);
    expect(decodeResult(fileOf())).toMatchObject({ second: null, family: null });
  });
});
