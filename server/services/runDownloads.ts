import { readingDefinitions } from '../../shared/readings.ts';
import { axisUnitOf, describeResult, encodeResultHeader } from '../../shared/resultFormat.ts';
import type { ResultHeader } from '../../shared/resultFormat.ts';
import type { ReadingName, SweepAxes } from '../../shared/run.ts';
import { axesOf } from '../../shared/runAxes.ts';
import type { PartialResult } from '../../worker/sweep/runSweep.ts';
import type { SweepRun } from '../models/run.ts';
import { sourceLines, toCsvLine } from './csvLines.ts';
import { quantityOf } from './runNames.ts';
import type { RunResult } from './runResult.ts';

/** Points read from the database at a time, and rows of CSV written at a time: the server stays responsive between. */
const POINTS_AT_A_TIME = 65_536;
const ROWS_AT_A_TIME = 2_048;

/** The header of the file that hands out these readings of a run. */
export function resultHeaderOf(run: SweepRun, readings: ReadingName[]): ResultHeader {
  const { input, solverVersion, inputSha256 } = run;
  return describeResult(input, readings, { solverVersion, inputSha256 });
}

/** The result file with the chosen readings (shared/resultFormat.ts), piece by piece. */
export async function* resultBytes(result: RunResult, readings: ReadingName[]): AsyncGenerator<Uint8Array> {
  yield encodeResultHeader(resultHeaderOf(result.run, readings));
  yield await result.readAxisBytes();
  for (const reading of readings) {
    for (const { start, count } of stretches(result.pointCount, POINTS_AT_A_TIME)) {
      yield await result.readBytes(reading, start, count);
    }
  }
}

/**
 * The same file of a run that is still being computed on this machine: NaN where nothing is computed yet. Threads
 * write meanwhile, so the end of a file may hold more points than its beginning; none that its header counts is
 * missing.
 *
 * @param header with `done`
 */
export function* partialResultBytes(
  run: SweepRun,
  soFar: PartialResult,
  header: ResultHeader,
): Generator<Uint8Array> {
  yield encodeResultHeader(header);
  for (const values of soFar.axes) yield bytesOf(values);
  for (const { name } of header.readings) {
    const column = soFar.columns[run.input.readings.indexOf(name)]!;
    for (const { start, count } of stretches(soFar.points, POINTS_AT_A_TIME)) {
      // Copied: what lies in shared memory may change while it is being sent.
      yield bytesOf(Float64Array.from(column.subarray(start, start + count)));
    }
  }
}

function bytesOf(values: Float64Array): Uint8Array {
  return new Uint8Array(values.buffer, values.byteOffset, values.byteLength);
}

/**
 * The chosen readings as CSV (RFC 4180) behind comment lines with the sources of every constant: a header line with names and units, a line for each point with the values
 * of all axes, an empty field where a reading does not exist. Numbers are written so that they read back to the same
 * double.
 */
export async function* resultCsv(result: RunResult, readings: ReadingName[]): AsyncGenerator<string> {
  const { input, materials } = result.run;
  const names = readings.map((name) => {
    const { label, unit } = readingDefinitions[name];
    return `${label} (${unit})`;
  });
  yield sourceLines(materials);
  yield toCsvLine([...axisTitles(input, materials), ...names]);
  const axes = await result.readAxes();
  for (const { start, count } of stretches(result.pointCount, POINTS_AT_A_TIME)) {
    const columns: Float64Array[] = axisColumns(axes, start, count);
    for (const reading of readings) columns.push(await result.readValues(reading, start, count));
    for (const rows of stretches(count, ROWS_AT_A_TIME)) yield toLines(columns, rows.start, rows.count);
  }
}

/** The value of every axis at each of the points, the first axis running fastest. */
function axisColumns(axes: Float64Array[], start: number, count: number): Float64Array[] {
  let repeats = 1;
  return axes.map((values) => {
    const each = repeats;
    repeats *= values.length;
    return Float64Array.from(
      { length: count },
      (_, row) => values[Math.floor((start + row) / each) % values.length]!,
    );
  });
}

function toLines(columns: Float64Array[], start: number, count: number): string {
  let text = '';
  for (let row = start; row < start + count; row += 1) {
    text += columns.map((column) => (Number.isNaN(column[row]) ? '' : String(column[row]))).join(',');
    text += '\r\n';
  }
  return text;
}

const usualTitles = {
  wavelength: 'Vacuum wavelength',
  angle: 'Angle of incidence',
  thickness: 'Layer thickness',
} as const;

/** Two axes may sweep the same of two layers: then the layers are named. */
function axisTitles(input: SweepRun['input'], materials: SweepRun['materials']): string[] {
  const axes = axesOf<SweepAxes['axis']>(input).map(({ axis }) => axis);
  return axes.map((axis) => {
    const isOnly = axes.filter(({ kind }) => kind === axis.kind).length === 1;
    const title =
      isOnly && axis.kind in usualTitles ? usualTitles[axis.kind as keyof typeof usualTitles] : null;
    const text = title ?? quantityOf(axis, input.document, materials);
    return `${text.charAt(0).toUpperCase()}${text.slice(1)} (${axisUnitOf(axis)})`;
  });
}

function* stretches(total: number, size: number): Generator<{ start: number; count: number }> {
  for (let start = 0; start < total; start += size) yield { start, count: Math.min(size, total - start) };
}
