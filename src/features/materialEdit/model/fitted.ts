import type { PlainIndex, PlainVoigt } from '../../../../shared/dispersion.ts';
import type { FitResult } from '../../../../shared/materialFit.ts';
import type { Material } from '../../../../shared/material.ts';
import { formatNumber, formatRange } from '../../../lib/format.ts';
import { sourceForm } from './formOfMaterial.ts';
import type { SourceForm } from './form.ts';

const modelNames = {
  sellmeier: 'a Sellmeier formula',
  cauchy: 'a Cauchy formula',
  oscillators: 'a sum of oscillators',
  lines: 'a sum of lines',
  formula: 'a formula',
  table: 'a table',
};

function nameOfModel(fitted: PlainIndex | PlainVoigt): string {
  return modelNames[fitted.kind === 'model' ? fitted.model.name : fitted.kind];
}

/** The source of fitted constants: that of the data, with the fit as the method and the confidence. */
export function fittedSource(target: 'index' | 'voigt', data: Material, result: FitResult): SourceForm {
  const { indexSource, voigtSource } = data.content;
  const source = sourceForm(target === 'voigt' && voigtSource ? voigtSource : indexSource);
  const wavelengths = result.residuals.wavelengthsNm;
  const range = formatRange([Math.min(...wavelengths), Math.max(...wavelengths)], 'nm');
  const quantity = target === 'index' ? 'n and k' : 'Q';
  const fit =
    `Fit of ${nameOfModel(result.fitted)} to ${result.points} points of ${quantity} of ${data.name} ` +
    `(version ${data.version}), ${range}; root mean square of the residuals ${formatNumber(result.deviation, { digits: 3 })}.`;
  return {
    ...source,
    confidence: 'fitted',
    method: source.method === '' ? fit : `${fit} The data: ${source.method}`,
  };
}
