import { ConventionSection, Formula, Matrix } from './ConventionSection.tsx';
import { GeometryDrawings } from './GeometryDrawings.tsx';
import { ImportSections } from './ImportSections.tsx';

const i = <var>i</var>;
const q = <var>Q</var>;
const m = (axis: string) => (
  <>
    <var>m</var>
    <sub>{axis}</sub>
  </>
);
const voigtRows = [
  [
    '1',
    <>
      {i}
      {q}
      {m('z')}
    </>,
    <>
      −{i}
      {q}
      {m('y')}
    </>,
  ],
  [
    <>
      −{i}
      {q}
      {m('z')}
    </>,
    '1',
    <>
      {i}
      {q}
      {m('x')}
    </>,
  ],
  [
    <>
      {i}
      {q}
      {m('y')}
    </>,
    <>
      −{i}
      {q}
      {m('x')}
    </>,
    '1',
  ],
];

/** Media, magnetization, and what sources are turned into. */
export function MaterialSections() {
  return (
    <>
      <ConventionSection id="voigt-constant" title="Voigt constant Q">
        <p>
          Magnetization adds an antisymmetric part to the permittivity. <var>m</var> is the magnetization as a
          fraction of saturation, a vector of length 0 to 1, and <var>ε</var>
          <sub>d</sub> = <var>N</var>
          <sup>2</sup>:
        </p>
        <Formula>
          <var>ε</var> = <var>ε</var>
          <sub>d</sub> <Matrix rows={voigtRows} />
        </Formula>
        <p>
          So for <var>m</var> along +<var>z</var>, <var>ε</var>
          <sub>xy</sub> = <var>iQε</var>
          <sub>d</sub>. <var>Q</var> is complex and has no unit.
        </p>
      </ConventionSection>

      <ConventionSection id="geometries" title="Polar, longitudinal, transverse">
        <GeometryDrawings />
        <p>
          Any direction between them may be entered. Layers keep the <var>m</var> they are drawn with; the
          working point uses them as drawn, reversed, or replaced by one direction in every magnetic layer
          that is not marked fixed.
        </p>
      </ConventionSection>

      <ImportSections />

      <ConventionSection id="media" title="Other media">
        <p>
          A uniaxial medium has an ordinary and an extraordinary index and an axis of any direction but zero;
          the entered index is the ordinary one, and <var>Q</var> still multiplies its square. A full 3×3
          tensor may stand instead of everything else; it carries its own magnetization, so its reversal is
          the transpose and its state at <var>m</var> = 0 the symmetric part.
        </p>
      </ConventionSection>

      <ConventionSection id="cubic-second-order" title="Second order of a cubic crystal">
        <p>
          Second order in <var>m</var>, for a cubic crystal with [100] turned by <var>γ</var> from{' '}
          <var>x</var> toward <var>y</var> and [001] along <var>z</var>, in the axes of the crystal:
        </p>
        <Formula>
          δ<var>ε</var>
          <sub>11</sub> = <var>G</var>
          <sub>11</sub> <var>m</var>
          <sub>1</sub>
          <sup>2</sup> + <var>G</var>
          <sub>12</sub> (<var>m</var>
          <sub>2</sub>
          <sup>2</sup> + <var>m</var>
          <sub>3</sub>
          <sup>2</sup>), δ<var>ε</var>
          <sub>12</sub> = δ<var>ε</var>
          <sub>21</sub> = 2<var>G</var>
          <sub>44</sub> <var>m</var>
          <sub>1</sub>
          <var>m</var>
          <sub>2</sub>, and cyclic
        </Formula>
        <p>
          The three <var>G</var> are complex, have no unit and are known at one wavelength. They add to{' '}
          <var>ε</var> beside <var>Q</var>; a layer may turn the crystal further, by three angles about{' '}
          <var>z</var>, the new <var>y</var> and the new <var>z</var>. The even part of a reading shows what
          they do.
        </p>
      </ConventionSection>

      <ConventionSection id="passive" title="Lossless and passive media">
        <p>
          Lossless means that <var>ε</var> is Hermitian: <var>N</var> and <var>Q</var> real. Passive means
          that no light is made: (<var>ε</var> − <var>ε</var>
          <sup>†</sup>)/2<var>i</var> has no negative eigenvalue, for a scalar <var>ε</var>
          <sub>d</sub>
        </p>
        <Formula>
          |<var>m</var>| |Im(<var>Qε</var>
          <sub>d</sub>)| ≤ Im <var>ε</var>
          <sub>d</sub>
        </Formula>
        <p>
          A medium that is not passive is computed with a warning that names it. Which of its waves run into
          the film is decided by continuity: the medium is followed from the passive one that it turns into
          when its loss is raised, so that a <var>Q</var> a little too large changes the answer a little.
          Refused are <var>k</var> &lt; 0, <var>n</var> &lt; 0, <var>N</var> = 0 and <var>ε</var>
          <sub>zz</sub> = 0.
        </p>
      </ConventionSection>
    </>
  );
}
