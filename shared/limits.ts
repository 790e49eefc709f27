/** Limits that both sides state in the same words. Changing one changes the refusal and its message. */
export const LIMITS = {
  /** Layers of one case after its blocks are expanded. */
  expandedLayers: 100_000,
  /** Blocks inside blocks inside blocks. */
  blockDepth: 3,
  repeat: 1_000,
  /** Points (wavelength x angle, over all cases) of one call on the command line. */
  commandLinePoints: 1_000_000,
  /** Points of one `POST /api/v1/solve`; more than this is a run. */
  httpPoints: 20_000,
  /** Points of one run, over all its axes. */
  runPoints: 1_000_000,
  /** Readings that a run with two axes may store. */
  mapReadings: 6,
  /** Curves of a family. */
  familyCurves: 12,
  /** Rounding allowed above |m| = 1. */
  magnetizationSlack: 1e-9,
  /** Layers and blocks that one stack document may list. */
  documentItems: 2_000,
  nameLength: 120,
  noteLength: 2_000,
  /** Working points of one design question. */
  designPoints: 6,
  /** Thicknesses that one optimisation varies. */
  designVariables: 8,
  /** Layers drawn in a film whose derivatives are answered at once. */
  sensitivityLayers: 200,
  /** Thicknesses that a design question tries, nm: 1 cm is far beyond any film, and steps of 0.001 nm are still told apart. */
  designThicknessNm: 10_000_000,
  capCandidates: 12,
  capPoints: 400,
  toleranceSamples: 20_000,
  /** Points of a curve that is computed while somebody drags. */
  liveCurvePoints: 400,
  studyItems: 100,
  studyNoteLength: 20_000,
  /** Bytes of an imported table. */
  importBytes: 20_000_000,
  importRows: 200_000,
  importColumns: 64,
  /** Bytes of a JSON request body. */
  bodyBytes: 4_000_000,
} as const;
