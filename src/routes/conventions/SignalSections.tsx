import { ConventionSection, Formula } from './ConventionSection.tsx';

/** What explains a reading layer by layer, and what a sample that is not ideal changes. */
export function SignalSections() {
  return (
    <>
      <ConventionSection id="layer-shares" title="Layer shares">
        <p>
          To first order in <var>Q</var> the cross-polarized amplitude is an integral over depth of the fields{' '}
          <var>E</var> that unit <var>p</var> and <var>s</var> light make in the same stack with <var>Q</var>{' '}
          = 0:
        </p>
        <Formula>
          <var>r</var>
          <sub>sp</sub> ≈ <var>i</var>
          <var>k</var>
          <sub>0</sub>/(2 <var>N</var>
          <sub>0</sub> cos <var>θ</var>) ∫ <var>i</var>
          <var>Qε</var>
          <sub>d</sub> <var>E</var>
          <sub>y</sub>
          <sup>s</sup> (−<var>m</var>
          <sub>z</sub>
          <var>E</var>
          <sub>x</sub>
          <sup>p</sup> + <var>m</var>
          <sub>x</sub>
          <var>E</var>
          <sub>z</sub>
          <sup>p</sup>) d<var>z</var>
        </Formula>
        <p>
          The part of each magnetic layer is its share, a complex number; shares add up. For <var>r</var>
          <sub>ps</sub> and <var>r</var>
          <sub>pp</sub> there are like integrals. The exact amplitude differs from the sum by terms of second
          order in <var>Q</var>; that difference is shown beside it. A share <q>of the sum</q> is its part
          along the sum, so shares of the sum add up to 100 % and one that works against the others is
          negative.
        </p>
      </ConventionSection>

      <ConventionSection id="depth-profile" title="Depth profile">
        <p>
          |<var>E</var>| is the modulus of the whole field in the stack as it is, for incident light of unit
          amplitude. Absorbed per nm is the share of the incident power that is lost in a nanometre at that
          depth. Signal per nm is the modulus of the integrand of the layer shares of <var>r</var>
          <sub>sp</sub>. The depth runs down on the compressed scale of the drawing, evenly within each layer.
        </p>
      </ConventionSection>

      <ConventionSection id="real-sample" title="Real samples">
        <p>
          A <b>graded interface</b> lies half in either layer; the composition runs evenly through it, in
          slices of mixtures that are doubled until no amplitude changes by more than a stated tolerance. A{' '}
          <b>dead part</b> belongs to the thickness of its layer and carries no magnetization. An <b>oxide</b>{' '}
          takes the stated thickness of metal and becomes thicker by the stated ratio. A <b>mixture</b> is
          taken as far finer than the wavelength, by the formula of Bruggeman (both media alike) or of Maxwell
          Garnett (spheres of the second in the first), with the gyration that belongs to it.
        </p>
        <p>
          Light from the <b>back face</b> of a thick slab adds in intensity, not in amplitude. A <b>spread</b>{' '}
          of thickness, angle or wavelength is an average of Stokes parameters over seven nodes of a normal or
          a uniform distribution of the stated standard deviation. With either there is no amplitude{' '}
          <var>r</var>, and what is made of amplitudes alone stays empty.
        </p>
      </ConventionSection>

      <ConventionSection id="degree-of-polarization" title="Degree of polarization">
        <Formula>
          √(<var>S</var>
          <sub>1</sub>
          <sup>2</sup> + <var>S</var>
          <sub>2</sub>
          <sup>2</sup> + <var>S</var>
          <sub>3</sub>
          <sup>2</sup>)/<var>S</var>
          <sub>0</sub>
        </Formula>
        <p>of the reflected beam: 1 where intensities are neither added nor averaged.</p>
      </ConventionSection>
    </>
  );
}
