import { useMemo } from 'react';
import type { Material } from '../../../../shared/material.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';
import { formatPlain, formatTypedComplex } from '../../../lib/format.ts';
import { onSpectralAxis, spectralLabels } from './spectralScale.ts';
import type { SpectralUnit } from './spectralScale.ts';

type Voigt = NonNullable<Material['curves']['voigt']>;

/** Q against the spectrum, or as a number where it is known at one wavelength only. */
export function VoigtPanel({ material, unit }: { material: Material; unit: SpectralUnit }) {
  const { voigt } = material.curves;
  if (!voigt) {
    return (
      <p className="text-muted">
        No magneto-optic constant is known here. A layer of this material turns no polarization, whatever its
        magnetization.
      </p>
    );
  }
  const [only] = voigt.q;
  if (voigt.q.length === 1 && only) {
    return (
      <div>
        <p className="text-reading font-[560] tracking-[-0.02em]">{formatTypedComplex(only)}</p>
        <p className="mt-1 text-muted">
          Known at {formatPlain(voigt.wavelengthsNm[0] ?? NaN)} nm only. At other wavelengths a stack uses it
          only where somebody allows that for the layer, and every plot says so.
        </p>
      </div>
    );
  }
  return <VoigtPlot name={material.name} id={material.id} voigt={voigt} unit={unit} />;
}

function VoigtPlot({
  name,
  id,
  voigt,
  unit,
}: {
  name: string;
  id: string;
  voigt: Voigt;
  unit: SpectralUnit;
}) {
  const series = useMemo<PlotSeries[]>(() => {
    const part = (index: 0 | 1) =>
      onSpectralAxis(
        unit,
        voigt.wavelengthsNm,
        voigt.q.map((q) => q[index]),
      );
    return [
      { name: 'Re Q', ...part(0), tone: 'magnet', width: 2 },
      { name: 'Im Q', ...part(1), tone: 'magnet', width: 2, dash: 'dashed' },
    ];
  }, [unit, voigt]);
  const xAxis = useMemo(() => ({ label: spectralLabels[unit] }), [unit]);
  const yAxes = useMemo(() => [{ label: 'Q', include: [0] }], []);
  return (
    <LinePlot
      series={series}
      xAxis={xAxis}
      yAxes={yAxes}
      height={240}
      ariaLabel={`Voigt constant of ${name} against ${spectralLabels[unit]}`}
      fileName={`${id}-voigt`}
    />
  );
}
