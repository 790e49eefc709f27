import type { Complex } from '../../shared/complex.ts';
import type { IndexDispersion } from '../../shared/dispersion.ts';
import { squareRoot } from '../optics/complexNumber.ts';
import type { SampleOptions } from './table.ts';
import { sampleTable } from './table.ts';

type TensorDispersion = Extract<IndexDispersion, { kind: 'tensor' }>;

/** Rows x, y, z of [re, im]. */
export type SampledTensor = TensorDispersion['epsilon'][number];

const axes = [0, 1, 2] as const;

/** A free tensor at the asked wavelengths, element by element interpolated as any other table. */
export function sampleTensor(
  name: string,
  { wavelengthsNm: tableNm, epsilon }: TensorDispersion,
  wavelengthsNm: ArrayLike<number>,
  options: SampleOptions = {},
): SampledTensor[] {
  const columns = axes.flatMap((row) =>
    axes.flatMap((column) => [0, 1].map((part) => epsilon.map((tensor) => tensor[row][column][part]!))),
  );
  const sampled = sampleTable(name, tableNm, columns, wavelengthsNm, options);
  return Array.from(sampled[0]!, (_, i) =>
    mapElements((row, column) => {
      const first = 2 * (3 * row + column);
      return [sampled[first]![i]!, sampled[first + 1]![i]!];
    }),
  );
}

/** The tensor of the reversed magnetization is the transpose, that of none the symmetric part (physics.md section 2). */
export function inTensorState(
  tensor: SampledTensor,
  state: 'reversed' | 'unmagnetized' | undefined,
): SampledTensor {
  if (state === undefined) return tensor;
  return mapElements((row, column) => {
    const [given, mirrored] = [tensor[row][column], tensor[column][row]];
    if (state === 'reversed') return [mirrored[0], mirrored[1]];
    return [(given[0] + mirrored[0]) / 2, (given[1] + mirrored[1]) / 2];
  });
}

/** N = sqrt(trace / 3), the index that a plot of a tensor shows. */
export function meanIndex(tensors: readonly SampledTensor[]): { n: Float64Array; k: Float64Array } {
  const n = new Float64Array(tensors.length);
  const k = new Float64Array(tensors.length);
  tensors.forEach(([x, y, z], i) => {
    const trace: Complex = [x[0][0] + y[1][0] + z[2][0], x[0][1] + y[1][1] + z[2][1]];
    const root = squareRoot([trace[0] / 3, trace[1] / 3]);
    n[i] = root[0];
    k[i] = Math.max(root[1], 0);
  });
  return { n, k };
}

function mapElements(element: (row: 0 | 1 | 2, column: 0 | 1 | 2) => Complex): SampledTensor {
  const rowOf = (row: 0 | 1 | 2): SampledTensor[0] => [element(row, 0), element(row, 1), element(row, 2)];
  return [rowOf(0), rowOf(1), rowOf(2)];
}
