import { useMemo } from 'react';
import type { Material } from '../../../../shared/material.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotAxis, PlotSeries } from '../../../components/plot/plotTypes.ts';
import { usePlotHeight } from '../../../components/plot/usePlotHeight.ts';
import { formatNumber, formatPlain, formatTypedComplex } from '../../../lib/format.ts';
import { curveOf, extraordinaryCurveOf, quantityTexts, tabulatedOf } from '../model/spectralCurves.ts';
import type { SpectralCurve, SpectralQuantity } from '../model/spectralCurves.ts';
import { onSpectralAxis, spectralAxis } from './spectralScale.ts';
import type { SpectralUnit } from './spectralScale.ts';

type Props = { material: Material; quantity: SpectralQuantity; unit: SpectralUnit };

/** A quantity against the spectrum, or as a number where it is known at one wavelength only. */
export function QuantityPlot({ material, quantity, unit }: Props) {
  const curve = useMemo(() => curveOf(material, quantity), [material, quantity]);
  if (curve === null) {
    return (
      <p className="py-6 text-muted">
        No magneto-optic constant is known here. A layer of this material turns no polarization, whatever its
        magnetization.
      </p>
    );
  }
  const [only] = curve.values;
  if (curve.values.length === 1 && only) {
    return <OneValue quantity={quantity} value={only} wavelengthNm={curve.wavelengthsNm[0] ?? NaN} />;
  }
  return <Curves material={material} quantity={quantity} unit={unit} curve={curve} />;
}

function OneValue(props: {
  quantity: SpectralQuantity;
  value: readonly [number, number];
  wavelengthNm: number;
}) {
  const { quantity, value, wavelengthNm } = props;
  const derived = quantity === 'epsXy' || quantity === 'eps';
  const rounded = derived ? ([round(value[0]), round(value[1])] as const) : value;
  return (
    <div className="py-6">
      <p className="text-reading font-[560] tracking-[-0.02em]">
        {Number.isNaN(value[0]) ? 'N is not known here' : formatTypedComplex(rounded)}
      </p>
      <p className="mt-1 max-w-prose text-muted">
        {quantityTexts[quantity].label} is known at {formatPlain(wavelengthNm)} nm only. At other wavelengths
        a stack uses it only where somebody allows that for the layer, and every plot says so.
      </p>
    </div>
  );
}

function round(value: number): number {
  return Number(value.toPrecision(5));
}

/** Two scales for N: beside the k of a metal, or that of a glass, the run of n would be a flat line on one. */
function axesOf(quantity: SpectralQuantity, absorbs: boolean): PlotAxis[] {
  const format = (value: number) => formatNumber(value, { digits: 5 });
  switch (quantity) {
    case 'N': {
      const k = { label: 'k', include: [0], format };
      return absorbs ? [{ label: 'n', format }, k] : [{ label: 'n', format }];
    }
    case 'eps':
      return [{ label: 'ε', include: [0], format }];
    case 'Q':
      return [{ label: 'Q', include: [0], format }];
    case 'epsXy':
      return [{ label: 'ε_xy', include: [0], format }];
  }
}

function Curves({ material, quantity, unit, curve }: Props & { curve: SpectralCurve }) {
  const height = usePlotHeight(420);
  const drawn = useMemo(() => {
    const extra = extraordinaryCurveOf(material, quantity);
    const absorbs = [curve, extra].some((one) => one?.values.some(([, imaginary]) => imaginary !== 0));
    const yAxes = axesOf(quantity, absorbs);
    const ordinary = seriesOf(
      curve,
      tabulatedOf(material, quantity),
      quantity,
      unit,
      extra ? 'ordinary' : '',
    );
    const all = extra ? [...ordinary, ...seriesOf(extra, null, quantity, unit, 'extraordinary')] : ordinary;
    // An index that does not absorb has no k worth a curve and a scale of its own.
    const series = absorbs ? all : all.filter(({ name }) => !name.startsWith(quantityTexts.N.parts[1]));
    return { series: quantity === 'N' ? series : all, yAxes };
  }, [material, quantity, unit, curve]);
  const xAxis = spectralAxis[unit];
  return (
    <LinePlot
      series={drawn.series}
      xAxis={xAxis}
      yAxes={drawn.yAxes}
      height={height}
      ariaLabel={`${quantityTexts[quantity].label} of ${material.name} against ${xAxis.label}`}
      fileName={`${material.id}-${quantity}`}
    />
  );
}

/** Real part solid, imaginary part dashed; what is extraordinary is thinner and has open markers. */
function seriesOf(
  curve: SpectralCurve,
  tabulated: SpectralCurve | null,
  quantity: SpectralQuantity,
  unit: SpectralUnit,
  which: '' | 'ordinary' | 'extraordinary',
): PlotSeries[] {
  const magnetoOptic = quantity === 'Q' || quantity === 'epsXy';
  return ([0, 1] as const).map((part): PlotSeries => {
    const along = ({ wavelengthsNm, values }: SpectralCurve) =>
      onSpectralAxis(
        unit,
        wavelengthsNm,
        values.map((value) => value[part]),
      );
    const rightScale = quantity === 'N' && part === 1;
    const name = quantityTexts[quantity].parts[part];
    return {
      name: [name, which, rightScale ? '(right scale)' : ''].filter(Boolean).join(' '),
      ...along(curve),
      ...(tabulated ? { points: along(tabulated) } : {}),
      tone: magnetoOptic ? 'magnet' : part === 0 ? 'ink' : 'accent',
      width: which === 'extraordinary' ? 1.1 : 1.8,
      dash: part === 0 ? 'solid' : 'dashed',
      symbol: which === 'extraordinary' ? 'open' : 'none',
      yAxisIndex: rightScale ? 1 : 0,
    };
  });
}
