import type { Sensitivity } from '../../../../shared/toleranceDesign.ts';

export type SensitivityRow = Sensitivity & {
  /** Change of the rotation when the parameter grows by 1 % of its value, deg. */
  rotationPerPercentDeg: number | null;
};

/** The parameters that move the rotation most come first; those that do not have one last. */
export function sensitivityRows(sensitivities: readonly Sensitivity[]): SensitivityRow[] {
  const size = ({ rotationPerPercentDeg: change }: SensitivityRow) =>
    change === null ? -1 : Math.abs(change);
  return sensitivities
    .map((one) => {
      const { rotationDeg } = one.derivative;
      return { ...one, rotationPerPercentDeg: rotationDeg === null ? null : (rotationDeg * one.value) / 100 };
    })
    .sort((a, b) => size(b) - size(a));
}
