import { z } from 'zod';
import { readingDefinitions } from './readings.ts';
import { readingsStripSchema } from './readingsStrip.ts';
import { axisSchema, readingNames } from './run.ts';
import type { ReadingName, SweepAxes, SweepAxis } from './run.ts';
import { axesOf, pointCountOf } from './runAxes.ts';

/**
 * The binary file of a run's numbers, the same in the database, over HTTP and in the browser.
 *
 *     bytes 0..7      "SKEWRUN" and a zero byte
 *     bytes 8..11     format version, Uint32
 *     bytes 12..15    length of the header in bytes, Uint32: a multiple of 8
 *     bytes 16..      header: JSON in UTF-8, filled up with spaces
 *     then            Float64 columns: the values of each axis (axis, second, family: those that the run has), then
 *                     header.readings in their order with `pointCount` values each
 *
 * A reading at the points of the axes: index = (familyIndex * second.points + secondIndex) * axis.points + index on
 * the first axis. A file of one axis has format version 1, of several version 2.
 *
 * All numbers are little-endian. Columns start on 8-byte borders, so that a reader can lay a Float64Array over
 * each without copying. A reading that does not exist at a point is NaN, and so is
 * one that has not been computed yet in a file with `done`.
 */
const MAGIC = [0x53, 0x4b, 0x45, 0x57, 0x52, 0x55, 0x4e, 0x00];
const ONE_AXIS_VERSION = 1;
const SEVERAL_AXES_VERSION = 2;
const PREAMBLE_BYTES = 16;
const BYTES_PER_VALUE = 8;

const columnSchema = z.object({ name: z.enum(readingNames), unit: z.string() });

const axisUnits = ['nm', 'deg', '1'] as const;
export type AxisUnit = (typeof axisUnits)[number];
const axisUnitSchema = z.enum(axisUnits);

const resultHeaderSchema = z.object({
  axis: axisSchema,
  axisUnit: axisUnitSchema,
  second: axisSchema.optional(),
  secondUnit: axisUnitSchema.optional(),
  family: axisSchema.optional(),
  familyUnit: axisUnitSchema.optional(),
  readings: z.array(columnSchema),
  /** Of all axes together. */
  pointCount: z.int().min(1),
  /** Points computed when the file was made; absent once all are. */
  done: z.int().min(0).optional(),
  solverVersion: z.string(),
  /** SHA-256 of everything the numbers were computed from. */
  inputSha256: z.string(),
  /** The readings at the working point of the film; only of a live curve that was asked for them. */
  strip: readingsStripSchema.optional(),
});

export type ResultHeader = z.infer<typeof resultHeaderSchema>;

export type RunResult = {
  header: ResultHeader;
  axis: Float64Array;
  second: Float64Array | null;
  family: Float64Array | null;
  columns: Partial<Record<ReadingName, Float64Array>>;
};

/** Bytes that are no result, and where they stop to be one. */
export class ResultFormatError extends Error {
  override readonly name = 'ResultFormatError';
}

const unitsByKind: Record<SweepAxis['kind'], AxisUnit> = {
  wavelength: 'nm',
  angle: 'deg',
  thickness: 'nm',
  direction: 'deg',
  voigtScale: '1',
  repeat: '1',
  graded: 'nm',
};

export function axisUnitOf(axis: SweepAxis): AxisUnit {
  return unitsByKind[axis.kind];
}

/** The header of a result with these readings, in this order. */
export function describeResult(
  { axis, second, family }: SweepAxes,
  readings: readonly ReadingName[],
  provenance: { solverVersion: string; inputSha256: string },
): ResultHeader {
  return {
    axis,
    axisUnit: axisUnitOf(axis),
    ...(second && { second, secondUnit: axisUnitOf(second) }),
    ...(family && { family, familyUnit: axisUnitOf(family) }),
    readings: readings.map((name) => ({ name, unit: readingDefinitions[name].unit })),
    pointCount: pointCountOf({ axis, second, family }),
    ...provenance,
  };
}

/** Everything before the first column. The columns follow as plain Float64 bytes, so that a file can be streamed. */
export function encodeResultHeader(header: ResultHeader): Uint8Array {
  const json = new TextEncoder().encode(JSON.stringify(header));
  const headerBytes = Math.ceil(json.length / BYTES_PER_VALUE) * BYTES_PER_VALUE;
  const bytes = new Uint8Array(PREAMBLE_BYTES + headerBytes).fill(0x20);
  bytes.set(MAGIC);
  const view = new DataView(bytes.buffer);
  view.setUint32(8, axesOf(header).length > 1 ? SEVERAL_AXES_VERSION : ONE_AXIS_VERSION, true);
  view.setUint32(12, headerBytes, true);
  bytes.set(json, PREAMBLE_BYTES);
  return bytes;
}

/** Bytes of the whole file. */
export function resultByteLength(header: ResultHeader): number {
  return encodeResultHeader(header).length + valueCount(header) * BYTES_PER_VALUE;
}

/** Values in all columns together. */
function valueCount(header: ResultHeader): number {
  return axisValueCount(header) + header.readings.length * header.pointCount;
}

/** Values in the columns of the axes, which stand before the first reading. */
export function axisValueCount(axes: SweepAxes): number {
  return axesOf(axes).reduce((sum, { axis }) => sum + axis.points, 0);
}

/**
 * Reads a result. The columns are views into `buffer`, not copies.
 *
 * @throws ResultFormatError with the offending value when the bytes are damaged, cut off or of another version
 */
export function decodeResult(buffer: ArrayBuffer): RunResult {
  const columnsAt = columnsOffset(buffer, buffer.byteLength);
  const header = parseHeader(buffer, columnsAt - PREAMBLE_BYTES);
  const expected = columnsAt + valueCount(header) * BYTES_PER_VALUE;
  if (buffer.byteLength !== expected) {
    throw new ResultFormatError(
      `A result of ${header.pointCount} points and ${header.readings.length} readings has ${expected} bytes, got ${buffer.byteLength}: the transfer was cut off or changed; load it again.`,
    );
  }
  let at = columnsAt;
  const nextColumn = (length: number) => {
    const column = new Float64Array(buffer, at, length);
    at += length * BYTES_PER_VALUE;
    return column;
  };
  const axisColumn = (axis: SweepAxis) => {
    const values = nextColumn(axis.points);
    checkAxis(axis, values);
    return values;
  };
  return {
    header,
    axis: axisColumn(header.axis),
    second: header.second ? axisColumn(header.second) : null,
    family: header.family ? axisColumn(header.family) : null,
    columns: Object.fromEntries(header.readings.map(({ name }) => [name, nextColumn(header.pointCount)])),
  };
}

/**
 * Where the first column begins.
 *
 * @param start the first 16 bytes of a result, or more
 * @param fileBytes length of the whole result
 * @throws ResultFormatError when this is no result of a version that this code knows
 */
export function columnsOffset(start: ArrayBuffer, fileBytes: number): number {
  if (new Uint8Array(new Uint32Array([1]).buffer)[0] !== 1) {
    throw new ResultFormatError('Results are little-endian and this machine is not.');
  }
  if (start.byteLength < PREAMBLE_BYTES) {
    throw new ResultFormatError(`A result has at least ${PREAMBLE_BYTES} bytes, got ${start.byteLength}.`);
  }
  const magic = [...new Uint8Array(start, 0, MAGIC.length)];
  if (MAGIC.some((byte, position) => magic[position] !== byte)) {
    const hex = magic.map((byte) => byte.toString(16).padStart(2, '0')).join(' ');
    throw new ResultFormatError(`This is not a result of a run: it begins with the bytes ${hex}.`);
  }
  const view = new DataView(start);
  const version = view.getUint32(8, true);
  if (version !== ONE_AXIS_VERSION && version !== SEVERAL_AXES_VERSION) {
    throw new ResultFormatError(
      `This reader knows the formats ${ONE_AXIS_VERSION} and ${SEVERAL_AXES_VERSION}, got format ${version}.`,
    );
  }
  const headerBytes = view.getUint32(12, true);
  if (headerBytes % BYTES_PER_VALUE !== 0 || PREAMBLE_BYTES + headerBytes > fileBytes) {
    throw new ResultFormatError(
      `The header must have a multiple of ${BYTES_PER_VALUE} bytes within ${fileBytes}, got ${headerBytes}.`,
    );
  }
  return PREAMBLE_BYTES + headerBytes;
}

function parseHeader(buffer: ArrayBuffer, headerBytes: number): ResultHeader {
  const text = new TextDecoder().decode(new Uint8Array(buffer, PREAMBLE_BYTES, headerBytes));
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch {
    throw new ResultFormatError(`The header is not JSON: ${text.slice(0, 60)}`);
  }
  const parsed = resultHeaderSchema.safeParse(json);
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    throw new ResultFormatError(`The header is not right at ${issue?.path.join('.')}: ${issue?.message}`);
  }
  const points = pointCountOf(parsed.data);
  if (parsed.data.pointCount !== points) {
    const axes = axesOf(parsed.data).length > 1 ? 'axes have' : 'axis has';
    throw new ResultFormatError(`The ${axes} ${points} points, but pointCount is ${parsed.data.pointCount}.`);
  }
  return parsed.data;
}

/** The ends of the axis are exact: a shift of the columns by any number of bytes shows here. */
function checkAxis(axis: SweepAxis, values: Float64Array): void {
  const ends: [number, number, number][] = [[0, axis.from, values[0]!]];
  if (axis.points > 1) ends.push([axis.points - 1, axis.to, values[axis.points - 1]!]);
  for (const [index, expected, got] of ends) {
    if (got !== expected) {
      throw new ResultFormatError(`The axis must be ${expected} at point ${index}, got ${got}.`);
    }
  }
}
