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

  /** @param buffer where the columns lie one after the other; give a shared one to fill it from several threads */
  constructor(
    capacity: number,
    withTransmission = false,
    buffer: ArrayBufferLike = new ArrayBuffer(BatchResult.bytes(capacity, withTransmission)),
  ) {
    this.withTransmission = withTransmission;
    this.columns = Array.from(
      { length: withTransmission ? ALL_COLUMNS : REFLECTION_COLUMNS },
      (_, column) => new Float64Array(buffer, 8 * capacity * column, capacity),
    );
  }

  /** Length of the buffer of a result. */
  static bytes(capacity: number, withTransmission = false): number {
    return 8 * capacity * (withTransmission ? ALL_COLUMNS : REFLECTION_COLUMNS);
  }

  get capacity(): number {
    return this.columns[0]!.length;
  }
}
