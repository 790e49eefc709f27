import { useEffect } from 'react';
import type { ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import { Page } from '../../components/Page.tsx';
import { BeamSections } from './BeamSections.tsx';
import { FurtherSections } from './FurtherSections.tsx';
import { IntensitySections } from './IntensitySections.tsx';
import { KerrSections } from './KerrSections.tsx';
import { MaterialSections } from './MaterialSections.tsx';
import { ModelSections } from './ModelSections.tsx';
import { SignalSections } from './SignalSections.tsx';
import { UnitSections } from './UnitSections.tsx';

type Chapter = { title: string; Body: () => ReactNode; entries: readonly [id: string, name: string][] };

const chapters: readonly Chapter[] = [
  {
    title: 'Axes, time, beams',
    Body: BeamSections,
    entries: [
      ['axes', 'Axes'],
      ['time-factor', 'Time factor, N = n + ik'],
      ['beams', 'p and s'],
      ['amplitudes', 'Amplitudes r and t'],
    ],
  },
  {
    title: 'Materials',
    Body: MaterialSections,
    entries: [
      ['voigt-constant', 'Voigt constant Q'],
      ['geometries', 'Geometries'],
      ['sign-habits', 'Sign habits'],
      ['bulk-kerr', 'From Kerr angles to Q'],
      ['kerr-tables', 'From a conductivity to Q'],
      ['media', 'Other media'],
      ['cubic-second-order', 'Cubic, second order'],
      ['passive', 'Lossless and passive'],
    ],
  },
  {
    title: 'Models',
    Body: ModelSections,
    entries: [
      ['index-models', 'Models of the index'],
      ['magneto-optic-lines', 'Lines of Q'],
      ['user-formulas', 'Formulas of your own'],
      ['temperature', 'Temperature'],
      ['mixed-materials', 'Mixtures as materials'],
    ],
  },
  {
    title: 'Polarization',
    Body: KerrSections,
    entries: [
      ['ellipse', 'Azimuth and ellipticity'],
      ['kerr-rotation', 'Kerr rotation'],
      ['kerr-ellipticity', 'Kerr ellipticity'],
    ],
  },
  {
    title: 'Intensities',
    Body: IntensitySections,
    entries: [
      ['reflectance', 'Reflectance'],
      ['transmittance', 'Transmittance'],
      ['absorptance', 'Absorptance'],
      ['cross-polarized', 'Cross-polarized amplitude'],
      ['transverse-contrast', 'Transverse contrast'],
    ],
  },
  {
    title: 'Further quantities',
    Body: FurtherSections,
    entries: [
      ['odd-even', 'Odd and even part'],
      ['ceiling', 'Ceiling'],
      ['parts', 'Polar and longitudinal part'],
      ['faraday', 'Faraday angles'],
      ['circular-contrast', 'Circular contrast'],
      ['mueller', 'Mueller matrix'],
      ['input-azimuth', 'Input azimuth'],
    ],
  },
  {
    title: 'Where the signal comes from',
    Body: SignalSections,
    entries: [
      ['layer-shares', 'Layer shares'],
      ['depth-profile', 'Depth profile'],
      ['real-sample', 'Real samples'],
      ['degree-of-polarization', 'Degree of polarization'],
    ],
  },
  { title: 'Units', Body: UnitSections, entries: [['units', 'Units']] },
];

/** Every definition behind every number, on one page that opens without an account. */
export function ConventionsPage() {
  useScrollToAnchor();
  return (
    <Page
      title="Conventions"
      subtitle="One set of axes, signs and definitions for everything the program computes, shows and stores."
    >
      <div className="gap-12 lg:grid lg:grid-cols-[210px_minmax(0,760px)]">
        <nav
          aria-label="Definitions"
          className="mb-8 lg:sticky lg:top-6 lg:max-h-[calc(100dvh-48px)] lg:self-start lg:overflow-y-auto print:hidden"
        >
          <ul className="flex flex-col gap-3 text-note max-lg:grid max-lg:grid-cols-2">
            {chapters.map((chapter) => (
              <li key={chapter.title}>
                <span className="font-semibold">{chapter.title}</span>
                <ul>
                  {chapter.entries.map(([id, name]) => (
                    <li key={id}>
                      <a
                        href={`#${id}`}
                        className="inline-block py-0.5 text-muted no-underline hover:text-accent hover:underline"
                      >
                        {name}
                      </a>
                    </li>
                  ))}
                </ul>
              </li>
            ))}
          </ul>
        </nav>
        <div>
          {chapters.map(({ title, Body }) => (
            <section key={title} className="mb-10">
              <h2 className="mb-4 border-b border-line pb-1.5 text-[17px]">{title}</h2>
              <Body />
            </section>
          ))}
        </div>
      </div>
    </Page>
  );
}

/** The page is fetched after the address is read, so the browser alone would miss the anchor. */
function useScrollToAnchor(): void {
  const { hash } = useLocation();
  useEffect(() => {
    if (hash) document.getElementById(decodeURIComponent(hash.slice(1)))?.scrollIntoView();
  }, [hash]);
}
