import { ConventionSection, Formula, Fraction } from './ConventionSection.tsx';

/** Intensities, and the readings made of them. */
export function IntensitySections() {
  return (
    <>
      <ConventionSection id="reflectance" title="Reflectance R">
        <p>
          The reflected share of the power, both polarizations of the reflected beam together, for{' '}
          <var>p</var> and for <var>s</var> light:
        </p>
        <Formula>
          <var>R</var>
          <sub>p</sub> = |<var>r</var>
          <sub>pp</sub>|<sup>2</sup> + |<var>r</var>
          <sub>sp</sub>|<sup>2</sup>, <var>R</var>
          <sub>s</sub> = |<var>r</var>
          <sub>ss</sub>|<sup>2</sup> + |<var>r</var>
          <sub>ps</sub>|<sup>2</sup>
        </Formula>
      </ConventionSection>

      <ConventionSection id="transmittance" title="Transmittance T">
        <p>
          The share of the power that passes the last interface, from the energy flow just behind it. In a
          substrate that absorbs it is what enters it.
        </p>
        <Formula>
          <var>T</var> ={' '}
          <Fraction
            top={
              <>
                Re(<var>E</var>
                <sub>x</sub>
                <var>H</var>
                <sub>y</sub>* − <var>E</var>
                <sub>y</sub>
                <var>H</var>
                <sub>x</sub>*)
              </>
            }
            bottom={
              <>
                <var>N</var>
                <sub>0</sub> cos <var>θ</var>
              </>
            }
          />
        </Formula>
        <p>
          for an incident wave of unit amplitude, with <var>H</var> in units of <var>E</var>/<var>Z</var>
          <sub>0</sub>.
        </p>
      </ConventionSection>

      <ConventionSection id="absorptance" title="Absorptance A">
        <p>
          What the layers absorb together. The loss inside the substrate is not in it, but in the
          transmittance.
        </p>
        <Formula>
          <var>A</var> = 1 − <var>R</var> − <var>T</var>
        </Formula>
      </ConventionSection>

      <ConventionSection id="cross-polarized" title="Cross-polarized amplitude">
        <p>
          |<var>r</var>
          <sub>sp</sub>| for <var>p</var> light and |<var>r</var>
          <sub>ps</sub>| for <var>s</var> light: the amplitude that magnetization brings into the other
          polarization.
        </p>
        <p>
          Behind an exactly crossed analyzer the intensity is its square, and the same for <var>m</var> and −
          <var>m</var>. A signal that changes sign with <var>m</var> needs an analyzer turned a little away
          from crossed.
        </p>
      </ConventionSection>

      <ConventionSection id="transverse-contrast" title="Transverse contrast">
        <p>
          With <var>m</var> across the plane of incidence no polarization turns; the reflectance changes. The
          contrast compares <var>m</var> with −<var>m</var>:
        </p>
        <Formula>
          <var>C</var> ={' '}
          <Fraction
            top={
              <>
                <var>R</var>(<var>m</var>) − <var>R</var>(−<var>m</var>)
              </>
            }
            bottom={
              <>
                <var>R</var>(<var>m</var>) + <var>R</var>(−<var>m</var>)
              </>
            }
          />
        </Formula>
        <p>
          In the readings strip it stands in the place of the rotation while the magnetization is transverse.
        </p>
      </ConventionSection>
    </>
  );
}
