import { ConventionSection, Formula, Fraction } from './ConventionSection.tsx';

/** Quantities that follow from the amplitudes, beside those of the readings strip. */
export function FurtherSections() {
  return (
    <>
      <ConventionSection id="odd-even" title="Odd and even part in m">
        <p>
          Reversing a field measures the odd part, half the difference of the angles at <var>m</var> and −
          <var>m</var>:
        </p>
        <Formula>
          <var>φ</var>
          <sub>odd</sub> = ½ fold(<var>φ</var>(<var>m</var>) − <var>φ</var>(−<var>m</var>)), <var>χ</var>
          <sub>odd</sub> = ½ (<var>χ</var>(<var>m</var>) − <var>χ</var>(−<var>m</var>))
        </Formula>
        <p>
          The even part is half the sum of the changes at <var>m</var> and −<var>m</var>. A single-state
          reading is not the odd part where second-order terms matter. The step between two stored states,
          such as one layer switched, is the difference of their readings.
        </p>
      </ConventionSection>

      <ConventionSection id="ceiling" title="Ceiling of the cross-polarized amplitude">
        <p>
          To first order in <var>Q</var>, with <var>A</var>
          <sub>p</sub> and <var>A</var>
          <sub>s</sub> the energy that <var>p</var> and <var>s</var> light lose in a magnetic material in the
          stack with <var>Q</var> = 0, layers of one material and the substrate summed:
        </p>
        <Formula>
          |<var>r</var>
          <sub>sp</sub>| ≤ Σ |<var>m</var>|{' '}
          <Fraction
            top={
              <>
                |<var>Qε</var>
                <sub>d</sub>|
              </>
            }
            bottom={
              <>
                2 Im <var>ε</var>
                <sub>d</sub>
              </>
            }
          />{' '}
          √(<var>A</var>
          <sub>p</sub>
          <var>A</var>
          <sub>s</sub>)
        </Formula>
        <p>
          Since the energies cannot exceed 1, the largest |<var>m</var>||<var>Qε</var>
          <sub>d</sub>|/(2 Im <var>ε</var>
          <sub>d</sub>) is what no arrangement of other layers can beat. There is no ceiling for a material
          without loss.
        </p>
      </ConventionSection>

      <ConventionSection id="parts" title="Polar-like and longitudinal-like part">
        <Formula>
          ½ (<var>r</var>
          <sub>sp</sub> + <var>r</var>
          <sub>ps</sub>) and ½ (<var>r</var>
          <sub>sp</sub> − <var>r</var>
          <sub>ps</sub>)
        </Formula>
        <p>
          To first order in <var>Q</var>, for a stack that is isotropic at <var>m</var> = 0, the first comes
          from <var>m</var>
          <sub>z</sub> and the second from <var>m</var>
          <sub>x</sub>.
        </p>
      </ConventionSection>

      <ConventionSection id="faraday" title="Faraday rotation and ellipticity">
        <p>
          The same definitions as for reflection, from <var>t</var> instead of <var>r</var>.
        </p>
      </ConventionSection>

      <ConventionSection id="circular-contrast" title="Contrast of circular light">
        <p>
          Plus is the light with <var>S</var>
          <sub>3</sub> &gt; 0:
        </p>
        <Formula>
          (<var>E</var>
          <sub>p</sub>, <var>E</var>
          <sub>s</sub>) = (1, <var>i</var>)/√2, reading (<var>R</var>
          <sub>+</sub> − <var>R</var>
          <sub>−</sub>)/(<var>R</var>
          <sub>+</sub> + <var>R</var>
          <sub>−</sub>)
        </Formula>
      </ConventionSection>

      <ConventionSection id="mueller" title="Mueller matrix of reflection">
        <Formula>
          <var>M</var> = <var>U</var> (<var>r</var> ⊗ <var>r</var>*) <var>U</var>
          <sup>−1</sup>
        </Formula>
        <p>
          in the basis (<var>p</var>
          <sub>r</sub>, <var>s</var>) and the order <var>S</var>
          <sub>0</sub> to <var>S</var>
          <sub>3</sub>, not normalized. The rows of <var>U</var> are (1, 0, 0, 1), (1, 0, 0, −1), (0, 1, 1, 0)
          and (0, <var>i</var>, −<var>i</var>, 0).
        </p>
      </ConventionSection>

      <ConventionSection id="input-azimuth" title="Any input azimuth">
        <p>
          For linear light at the azimuth <var>α</var>, from <var>p</var> (0°) toward <var>s</var> (90°), Kerr
          rotation and ellipticity are the changes that magnetization makes, as for <var>p</var> and{' '}
          <var>s</var>: the stack as it is against the same stack with <var>m</var> = 0, both with that input.
          They are read from the Mueller matrices of the two, so they exist for partly polarized beams too.
        </p>
      </ConventionSection>
    </>
  );
}
