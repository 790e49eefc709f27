import { AxesDrawing } from './AxesDrawing.tsx';
import { ConventionSection, Formula } from './ConventionSection.tsx';

/** Axes, time, beams and amplitudes. */
export function BeamSections() {
  return (
    <>
      <ConventionSection id="axes" title="Axes">
        <div className="card p-3">
          <AxesDrawing />
        </div>
        <p>
          <var>x</var>, <var>y</var>, <var>z</var> are right-handed. The films lie in the plane <var>xy</var>;{' '}
          <var>z</var> points into the sample, from the incident medium to the substrate. The plane of
          incidence is <var>xz</var>, the page of the drawing, and <var>y</var> comes out of the page.
        </p>
        <p>
          Light arrives in an incident medium that is isotropic and without loss, index <var>N</var>
          <sub>0</sub> real and positive, at the angle <var>θ</var> to the normal, from 0 up to but not
          including 90°. With <var>λ</var> the vacuum wavelength and <var>k</var>
          <sub>0</sub> = 2π/<var>λ</var>, two numbers belong to the whole stack:
        </p>
        <Formula>
          <var>ξ</var> = <var>N</var>
          <sub>0</sub> sin <var>θ</var>, the same in every layer, and <var>q</var> = <var>N</var>
          <sub>0</sub> cos <var>θ</var>
        </Formula>
      </ConventionSection>

      <ConventionSection id="time-factor" title="Time factor and refractive index">
        <p>
          Fields vary as exp(−<var>iωt</var>). A medium that absorbs then has a positive imaginary part:
        </p>
        <Formula>
          <var>N</var> = <var>n</var> + <var>ik</var>, <var>k</var> ≥ 0, <var>ε</var> = <var>N</var>
          <sup>2</sup>
        </Formula>
        <p>
          Sources that write <var>n</var> − <var>ik</var> use the other time factor; their <var>k</var> is
          entered here with the plus sign. A negative <var>k</var> is refused, since here it would mean gain.
          The relative permeability is 1 everywhere.
        </p>
      </ConventionSection>

      <ConventionSection id="beams" title="p, s and the direction of travel">
        <p>
          Each beam has three unit vectors (<var>p</var>, <var>s</var>, <var>k</var>), right-handed in this
          order. <var>s</var> is the same for every beam, across the plane of incidence:
        </p>
        <Formula>
          <var>s</var> = (0, 1, 0)
        </Formula>
        <Formula>
          incident <var>p</var>
          <sub>i</sub> = (cos <var>θ</var>, 0, −sin <var>θ</var>), reflected <var>p</var>
          <sub>r</sub> = (−cos <var>θ</var>, 0, −sin <var>θ</var>)
        </Formula>
        <Formula>
          transmitted <var>p</var>
          <sub>t</sub> = (<var>c</var>
          <sub>t</sub>, 0, −<var>ξ</var>/<var>N</var>
          <sub>t</sub>), <var>c</var>
          <sub>t</sub> = √(1 − (<var>ξ</var>/<var>N</var>
          <sub>t</sub>)<sup>2</sup>)
        </Formula>
        <p>
          Of the two roots <var>c</var>
          <sub>t</sub> the one with Im(<var>N</var>
          <sub>t</sub>
          <var>c</var>
          <sub>t</sub>) &gt; 0 holds, or with the positive real part where there is no imaginary part. At
          normal incidence the two <var>p</var> vectors are opposite, so <var>r</var>
          <sub>pp</sub> = −<var>r</var>
          <sub>ss</sub> there.
        </p>
      </ConventionSection>

      <ConventionSection id="amplitudes" title="Reflection and transmission amplitudes">
        <p>
          <var>r</var>
          <sub>ab</sub> is the amplitude of the reflected <var>a</var> wave for a <var>b</var> wave of unit
          amplitude: the first letter leaves, the second arrives.
        </p>
        <Formula>
          <var>E</var>
          <sub>p</sub>
          <sup> r</sup> = <var>r</var>
          <sub>pp</sub> <var>E</var>
          <sub>p</sub>
          <sup> i</sup> + <var>r</var>
          <sub>ps</sub> <var>E</var>
          <sub>s</sub>
          <sup> i</sup>, <var>E</var>
          <sub>s</sub>
          <sup> r</sup> = <var>r</var>
          <sub>sp</sub> <var>E</var>
          <sub>p</sub>
          <sup> i</sup> + <var>r</var>
          <sub>ss</sub> <var>E</var>
          <sub>s</sub>
          <sup> i</sup>
        </Formula>
        <p>
          <var>t</var>
          <sub>ab</sub> likewise, from the incident wave at the first interface to the transmitted wave at the
          last one. It is given only where the substrate is isotropic: other substrates carry no single{' '}
          <var>p</var> and <var>s</var> wave.
        </p>
        <p>
          Checks that hold for every stack: <var>r</var>
          <sub>sp</sub> = <var>r</var>
          <sub>ps</sub> in polar geometry, <var>r</var>
          <sub>sp</sub> = −<var>r</var>
          <sub>ps</sub> in longitudinal geometry, and <var>r</var>
          <sub>ps</sub>(<var>m</var>
          <sub>x</sub>, <var>m</var>
          <sub>y</sub>, <var>m</var>
          <sub>z</sub>) = −<var>r</var>
          <sub>sp</sub>(<var>m</var>
          <sub>x</sub>, <var>m</var>
          <sub>y</sub>, −<var>m</var>
          <sub>z</sub>).
        </p>
      </ConventionSection>
    </>
  );
}
