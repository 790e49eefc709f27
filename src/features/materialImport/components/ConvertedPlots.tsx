import { useMemo } from 'react';
import type { ImportPreview, SpectralUnit } from '../../../../shared/materialImport.ts';
import { photonEnergyEv } from '../../../../shared/units.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';

const energies: readonly SpectralUnit[] = ['eV', 'cm-1', 'THz'];

type Axis = { label: string; of: (wavelengthNm: number) => number };

/** A table that runs in energy or frequency is drawn over energy, any other over the wavelength. */
function axisFor(unit: SpectralUnit): Axis {
  return energies.includes(unit)
    ? { label: 'photon energy (eV)', of: photonEnergyEv }
    : { label: 'vacuum wavelength (nm)', of: (wavelengthNm) => wavelengthNm };
}

type ConvertedPlotsProps = { preview: ImportPreview; unit: SpectralUnit };

/** The converted constants over the axis that the table runs in. */
export function ConvertedPlots({ preview, unit }: ConvertedPlotsProps) {
  const axis = axisFor(unit);
  const { index, voigt } = preview;
  return (
    <div className={`grid gap-4 ${index && voigt ? 'lg:grid-cols-2' : ''}`}>
      {index ? <IndexPlot index={index} axis={axis} /> : null}
      {voigt ? <VoigtPlot voigt={voigt} axis={axis} /> : null}
    </div>
  );
}

function IndexPlot({ index, axis }: { index: NonNullable<ImportPreview['index']>; axis: Axis }) {
  const series = useMemo<PlotSeries[]>(() => {
    const x = index.wavelengthsNm.map(axis.of);
    return [
      { name: 'n', x, y: index.n, tone: 'ink', width: 1.6 },
      { name: 'k', x, y: index.k, tone: 'accent', width: 1.6, dash: 'dashed' },
    ];
  }, [index, axis]);
  return <Curves title="n and k" label="n, k" series={series} axis={axis} fileName="import-index" />;
}

function VoigtPlot({ voigt, axis }: { voigt: NonNullable<ImportPreview['voigt']>; axis: Axis }) {
  const series = useMemo<PlotSeries[]>(() => {
    const x = voigt.wavelengthsNm.map(axis.of);
    return [
      { name: 'Re Q', x, y: voigt.q.map(([re]) => re), tone: 'magnet', width: 2 },
      { name: 'Im Q', x, y: voigt.q.map(([, im]) => im), tone: 'magnet', width: 2, dash: 'dashed' },
    ];
  }, [voigt, axis]);
  return <Curves title="Voigt constant Q" label="Q" series={series} axis={axis} fileName="import-voigt" />;
}

type CurvesProps = { title: string; label: string; series: PlotSeries[]; axis: Axis; fileName: string };

function Curves({ title, label, series, axis, fileName }: CurvesProps) {
  return (
    <div className="min-w-0">
      <h3 className="mb-1 text-body">{title}, converted</h3>
      <LinePlot
        series={series}
        xAxis={{ label: axis.label }}
        yAxes={[{ label, include: [0] }]}
        height={250}
        ariaLabel={`${title} as converted against ${axis.label}`}
        fileName={fileName}
      />
    </div>
  );
}
