/**
 * Columns of a batch: r_pp, r_ps, r_sp, r_ss as re, im; R_p, R_s; rotation and ellipticity of the reflected beam for p
 * and for s light, deg, NaN where there is no beam. With transmission also T_p, T_s and t_pp, t_ps, t_sp, t_ss (NaN
 * where the substrate's tensor is not a multiple of the identity). A = 1 - R - T.
 */
export const COLUMN = {
  r: 0,
  reflectanceP: 8,
  reflectanceS: 9,
  rotationP: 10,
  ellipticityP: 11,
  rotationS: 12,
  ellipticityS: 13,
  transmittanceP: 14,
  transmittanceS: 15,
  t: 16,
} as const;

const REFLECTION_COLUMNS = 14;
const ALL_COLUMNS = 24;

/** Room for the results of up to `capacity` points: `columns[c][i]` is column c of point i. */
export class BatchResult {
  readonly columns: Float64Array[];
  readonly withTransmission: boolean;

  constructor(capacity: number, withTransmission = false) {
    this.withTransmission = withTransmission;
    const count = withTransmission ? ALL_COLUMNS : REFLECTION_COLUMNS;
    const buffer = new ArrayBuffer(8 * capacity * count);
    this.columns = Array.from(
      { length: count },
      (_, column) => new Float64Array(buffer, 8 * capacity * column, capacity),
    );
  }

  get capacity(): number {
    return this.columns[0]!.length;
  }
}
