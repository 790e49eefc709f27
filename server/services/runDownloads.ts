import { readingDefinitions } from '../../shared/readings.ts';
import { axisUnitOf, describeResult, encodeResultHeader } from '../../shared/resultFormat.ts';
import type { ReadingName, SweepAxis } from '../../shared/run.ts';
import type { RunResult } from './runResult.ts';

/** Points read from the database at a time, and rows of CSV written at a time: the server stays responsive between. */
const POINTS_AT_A_TIME = 65_536;
const ROWS_AT_A_TIME = 2_048;

/** The result file with the chosen readings (shared/resultFormat.ts), piece by piece. */
export async function* resultBytes(result: RunResult, readings: ReadingName[]): AsyncGenerator<Uint8Array> {
  const { input, solverVersion, inputSha256 } = result.run;
  yield encodeResultHeader(describeResult(input, readings, { solverVersion, inputSha256 }));
  for (const column of [null, ...readings]) {
    for (const { start, count } of stretches(result.pointCount, POINTS_AT_A_TIME)) {
      yield await result.readBytes(column, start, count);
    }
  }
}

/**
 * The chosen readings as CSV (RFC 4180): a header line with names and units, a line for each point, an empty field
 * where a reading does not exist. Numbers are written so that they read back to the same double.
 */
export async function* resultCsv(result: RunResult, readings: ReadingName[]): AsyncGenerator<string> {
  const names = readings.map((name) => {
    const { label, unit } = readingDefinitions[name];
    return `${label} (${unit})`;
  });
  yield toLine([axisTitle(result.run.input.axis), ...names]);
  for (const { start, count } of stretches(result.pointCount, POINTS_AT_A_TIME)) {
    const columns: Float64Array[] = [];
    for (const column of [null, ...readings]) columns.push(await result.readValues(column, start, count));
    for (const rows of stretches(count, ROWS_AT_A_TIME)) yield toLines(columns, rows.start, rows.count);
  }
}

function toLines(columns: Float64Array[], start: number, count: number): string {
  let text = '';
  for (let row = start; row < start + count; row += 1) {
    text += columns.map((column) => (Number.isNaN(column[row]) ? '' : String(column[row]))).join(',');
    text += '\r\n';
  }
  return text;
}

function toLine(fields: string[]): string {
  return `${fields.map((field) => (/[",\r\n]/.test(field) ? `"${field.replaceAll('"', '""')}"` : field)).join(',')}\r\n`;
}

function axisTitle(axis: SweepAxis): string {
  const title = {
    wavelength: 'Vacuum wavelength',
    angle: 'Angle of incidence',
    thickness: 'Layer thickness',
    direction: 'Direction of m',
    voigtScale: 'Scale of Q',
    repeat: 'Repeats',
    graded: 'Interface width',
  }[axis.kind];
  return `${title} (${axisUnitOf(axis)})`;
}

function* stretches(total: number, size: number): Generator<{ start: number; count: number }> {
  for (let start = 0; start < total; start += size) yield { start, count: Math.min(size, total - start) };
}
