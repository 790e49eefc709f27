import { useMemo } from 'react';
import type { Material } from '../../../../shared/material.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import { formatPlain, formatTypedComplex } from '../../../lib/format.ts';
import type { Preview } from '../hooks/usePreview.ts';
import { indexFigure, voigtFigure } from '../model/curveSeries.ts';
import { Section } from './Section.tsx';

type Curves = Material['curves'];

const xAxis = { label: 'vacuum wavelength (nm)' };

type Props = {
  preview: Preview;
  /** How many problems are shown at their fields; what is not yet filled in has no mark. */
  marked: number;
  name: string;
  renderer?: 'canvas' | 'svg';
};

/** What the constants in the form look like to a stack; nothing is stored for it. */
export function PreviewPanel({ preview, marked, name, renderer = 'canvas' }: Props) {
  const { curves, pending, issues, error } = preview;
  return (
    <Section title="Preview">
      <p role="status" className={`text-note ${error ? 'text-danger' : 'text-muted'}`}>
        {stateOf(preview, marked)}
      </p>
      {curves ? (
        <div className={pending || issues.length > 0 ? 'opacity-50' : ''}>
          <IndexFigure curves={curves} name={name} renderer={renderer} />
          {curves.voigt ? <VoigtFigure voigt={curves.voigt} name={name} renderer={renderer} /> : null}
        </div>
      ) : (
        <div className="flex h-40 items-center justify-center rounded-control border border-dashed border-edge px-4 text-center text-muted">
          The curves appear here as soon as the constants can be read.
        </div>
      )}
    </Section>
  );
}

function stateOf({ curves, pending, issues, error }: Preview, marked: number): string {
  if (error) return `No preview: ${error.message}`;
  if (issues.length > 0) {
    const before = curves ? ' The curves are those of before.' : '';
    if (marked === 0) return `Something is not filled in yet.${before}`;
    const what = marked === 1 ? 'One value' : `${marked} values`;
    return `${what} cannot be used yet; see the marked fields.${before}`;
  }
  return pending ? 'Computing the curves' : 'As a stack will use it; nothing is stored yet.';
}

type FigureProps = { curves: Curves; name: string; renderer: 'canvas' | 'svg' };

function IndexFigure({ curves, name, renderer }: FigureProps) {
  const { series, yAxes } = useMemo(() => indexFigure(curves), [curves]);
  const [only] = curves.wavelengthsNm;
  if (curves.wavelengthsNm.length === 1 && only !== undefined) {
    return (
      <p>
        N = {formatTypedComplex([curves.n[0] ?? NaN, curves.k[0] ?? NaN])} at {formatPlain(only)} nm, the only
        wavelength at which it is known.
      </p>
    );
  }
  return (
    <LinePlot
      series={series}
      xAxis={xAxis}
      yAxes={yAxes}
      height={240}
      ariaLabel={`Preview of n and k of ${name}`}
      fileName={`${name}-index`}
      renderer={renderer}
    />
  );
}

type VoigtProps = { voigt: NonNullable<Curves['voigt']>; name: string; renderer: 'canvas' | 'svg' };

function VoigtFigure({ voigt, name, renderer }: VoigtProps) {
  const { series, yAxes } = useMemo(() => voigtFigure(voigt), [voigt]);
  const [only] = voigt.q;
  if (voigt.q.length === 1 && only) {
    return (
      <p className="mt-2">
        Q = {formatTypedComplex(only)} at {formatPlain(voigt.wavelengthsNm[0] ?? NaN)} nm, the only wavelength
        at which it is known.
      </p>
    );
  }
  return (
    <LinePlot
      series={series}
      xAxis={xAxis}
      yAxes={yAxes}
      height={200}
      ariaLabel={`Preview of Q of ${name}`}
      fileName={`${name}-voigt`}
      renderer={renderer}
    />
  );
}
