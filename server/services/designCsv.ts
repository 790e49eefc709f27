import type { CapDesign, CapPointCurves, CapResult } from '../../shared/capDesign.ts';
import type { DesignResult } from '../../shared/design.ts';
import type { Sensitivity, ToleranceDesign, ToleranceResult } from '../../shared/toleranceDesign.ts';
import type { DesignRun } from '../models/run.ts';
import { cellLine, commentLines, sourceLines } from './csvLines.ts';
import { demandWords, layerName, readingTitles, signalWords } from './designNames.ts';
import { optimiseLines } from './optimiseCsv.ts';

/**
 * An answer as CSV (RFC 4180) behind comment lines with the sources of every constant: a header line with names and
 * units, an empty field where a number does not exist. Numbers are written so that they read back to the same double.
 */
export function* designCsv(
  { input: { design }, materials }: DesignRun,
  result: DesignResult,
): Generator<string> {
  yield sourceLines(materials);
  if (design.kind === 'cap' && result.kind === 'cap') yield* capLines(design, result);
  if (design.kind === 'optimise' && result.kind === 'optimise') {
    const names = design.variables.map(({ layerId }) => layerName(layerId, design.document, materials));
    yield* optimiseLines(design, result, names);
  }
  if (design.kind === 'tolerance' && result.kind === 'tolerance') {
    yield* toleranceLines(design, result);
  }
}

type Curve = Exclude<keyof CapPointCurves, 'pointId'>;

/** A line for each candidate, working point and thickness. */
function* capLines(design: CapDesign, result: CapResult): Generator<string> {
  const unit = design.signal === 'amplitude' || design.signal === 'contrast' ? '1' : 'deg';
  const signal = `|${signalWords[design.signal]}|`;
  const columns: [Curve, string][] = [
    ['rotationDeg', 'Kerr rotation (deg)'],
    ['ellipticityDeg', 'Kerr ellipticity (deg)'],
    ['amplitude', 'Cross-polarized amplitude (1)'],
    ['contrast', 'Transverse contrast (1)'],
    ['reflectance', 'Reflectance (1)'],
    ['ceilingShare', 'Share of the ceiling (1)'],
    ['signal', `${signal} (${unit})`],
    ['signalLow', `${signal} at 15.865 % of the films (${unit})`],
    ['signalMedian', `${signal} at 50 % of the films (${unit})`],
    ['signalHigh', `${signal} at 84.135 % of the films (${unit})`],
    ['slopePercentPerNm', 'Change of the signal (%/nm)'],
    ['costPercent', 'Signal lost against no cap (%)'],
  ];
  yield cellLine([
    'Candidate',
    'Working point',
    'Thickness (nm)',
    ...columns.map(([, title]) => title),
    'Share of films that meet all demands (1)',
  ]);
  for (const { label, points, yield: shares } of result.candidates) {
    for (const [position, curves] of points.entries()) {
      const point = design.points[position]!.label;
      yield result.thicknessNm
        .map((nm, at) =>
          cellLine([label, point, nm, ...columns.map(([name]) => curves[name][at]), shares[at]]),
        )
        .join('');
    }
  }
}

type Reading = keyof Sensitivity['derivative'];

const spreadReadings: Reading[] = ['rotationDeg', 'ellipticityDeg', 'amplitude', 'contrast', 'reflectance'];

/** A line for each working point and reading; derivatives are further columns, in the unit of the line. */
function* toleranceLines({ points, demands }: ToleranceDesign, result: ToleranceResult): Generator<string> {
  const labels = new Map(points.map(({ id, label }) => [id, label]));
  const words = new Map(
    Object.entries(demands).map(([name, limit]) => [name, demandWords({ [name]: limit })[0]]),
  );
  const { yield: share, byDemand, sensitivities } = result;
  yield commentLines([
    ...(share
      ? [`Films that meet all demands: ${share.share} (95 % from ${share.low} to ${share.high})`]
      : []),
    ...byDemand.map(
      ({ demand, share: alone }) => `Films that meet ${words.get(demand) ?? demand} alone: ${alone}`,
    ),
  ]);
  const parameters = [...new Map(sensitivities.map((one) => [`${one.parameter} ${one.of}`, one] as const))];
  const quantiles = ['2.275', '15.865', '50', '84.135', '97.725'];
  yield cellLine([
    'Working point',
    'Reading',
    'Unit',
    'Nominal',
    'Mean',
    'Standard deviation',
    ...quantiles.map((percent) => `At ${percent} % of the films`),
    'Films with a value',
    ...parameters.map(
      ([, { label, parameter }]) =>
        `Derivative by ${label} (unit per ${parameter === 'thickness' ? 'nm' : '1'})`,
    ),
  ]);
  for (const { pointId, nominal, distributions } of result.points) {
    for (const name of spreadReadings) {
      const found = distributions[name];
      const derivatives = parameters.map(
        ([key]) =>
          sensitivities.find((one) => one.pointId === pointId && `${one.parameter} ${one.of}` === key)
            ?.derivative[name],
      );
      yield cellLine([
        labels.get(pointId),
        readingTitles[name].title,
        readingTitles[name].unit,
        nominal[name],
        found?.mean,
        found?.deviation,
        ...(found?.quantiles ?? quantiles.map(() => null)),
        found?.samples ?? 0,
        ...derivatives,
      ]);
    }
  }
}
