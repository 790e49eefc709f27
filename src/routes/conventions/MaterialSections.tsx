import { ConventionSection, Formula, Fraction, Matrix } from './ConventionSection.tsx';
import { GeometryDrawings } from './GeometryDrawings.tsx';

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

/** Media, magnetization and the sign habits of sources. */
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

      <ConventionSection id="sign-habits" title="Sign habits of other sources">
        <p>
          Papers differ in the time factor and in the sign of <var>ε</var>
          <sub>xy</sub>. What is typed or imported is turned into the habit of this page, and what was entered
          is kept beside it:
        </p>
        <div className="card overflow-x-auto" tabIndex={0} role="region" aria-label="Sign habits">
          <table className="w-full min-w-[420px] text-left">
            <thead className="text-note text-muted">
              <tr className="border-b border-line">
                <th className="px-4 py-2 font-medium">time factor of the source</th>
                <th className="px-4 py-2 font-medium">
                  its <var>ε</var>
                  <sub>xy</sub> for +<var>z</var>
                </th>
                <th className="px-4 py-2 font-medium">
                  <var>Q</var> here
                </th>
                <th className="px-4 py-2 font-medium">
                  <var>N</var> here
                </th>
              </tr>
            </thead>
            <tbody>
              <Habit time="exp(−iωt)" element="+iQε" voigt="Q" index="N" />
              <Habit time="exp(−iωt)" element="−iQε" voigt="−Q" index="N" />
              <Habit time="exp(+iωt)" element="+iQε" voigt="−Q*" index="N*" />
              <Habit time="exp(+iωt)" element="−iQε" voigt="Q*" index="N*" />
            </tbody>
          </table>
        </div>
        <p>
          An entered tensor element is conjugated for exp(+<var>iωt</var>) only; then <var>Q</var> ={' '}
          <var>ε</var>
          <sub>xy</sub>/(<var>iε</var>
          <sub>d</sub>). Ask of every source also whether its positive field points into or out of the film.
        </p>
      </ConventionSection>

      <ConventionSection id="kerr-tables" title="From a measured Kerr angle or a conductivity to Q">
        <p>
          A bulk sample at normal incidence, <var>m</var> along +<var>z</var>, <var>p</var> light, signs of
          this page. With
        </p>
        <Formula>
          <var>ρ</var>(<var>Q</var>) ={' '}
          <Fraction
            top={
              <>
                <var>N</var>
                <sub>0</sub> − <var>N</var>√(1+<var>Q</var>)
              </>
            }
            bottom={
              <>
                <var>N</var>
                <sub>0</sub> + <var>N</var>√(1+<var>Q</var>)
              </>
            }
          />
        </Formula>
        <p>the ratio of the amplitudes is exactly</p>
        <Formula>
          <var>κ</var> = <var>r</var>
          <sub>sp</sub>/<var>r</var>
          <sub>pp</sub> = <var>i</var>{' '}
          <Fraction
            top={
              <>
                <var>ρ</var>(<var>Q</var>) − <var>ρ</var>(−<var>Q</var>)
              </>
            }
            bottom={
              <>
                <var>ρ</var>(<var>Q</var>) + <var>ρ</var>(−<var>Q</var>)
              </>
            }
          />{' '}
          ≈{' '}
          <Fraction
            top={
              <>
                <var>iN</var>
                <sub>0</sub>
                <var>NQ</var>
              </>
            }
            bottom={
              <>
                <var>N</var>
                <sup>2</sup> − <var>N</var>
                <sub>0</sub>
                <sup>2</sup>
              </>
            }
          />
        </Formula>
        <p>and rotation and ellipticity give it as</p>
        <Formula>
          <var>κ</var> ={' '}
          <Fraction
            top={
              <>
                tan <var>φ</var> + <var>i</var> tan <var>χ</var>
              </>
            }
            bottom={
              <>
                1 − <var>i</var> tan <var>φ</var> tan <var>χ</var>
              </>
            }
          />
        </Formula>
        <p>
          A conductivity, for exp(−<var>iωt</var>), gives <var>ε</var>
          <sub>xy</sub> = <var>iσ</var>
          <sub>xy</sub>/(<var>ε</var>
          <sub>0</sub>
          <var>ω</var>) in SI units and 4π<var>iσ</var>
          <sub>xy</sub>/<var>ω</var> in CGS units.
        </p>
      </ConventionSection>

      <ConventionSection id="media" title="Other media">
        <p>
          A uniaxial medium has an ordinary and an extraordinary index and an axis of any direction but zero;
          the entered index is the ordinary one, and <var>Q</var> still multiplies its square. A full 3×3
          tensor may stand instead of everything else; it carries its own magnetization, so its reversal is
          the transpose and its state at <var>m</var> = 0 the symmetric part.
        </p>
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

function Habit({
  time,
  element,
  voigt,
  index,
}: {
  time: string;
  element: string;
  voigt: string;
  index: string;
}) {
  return (
    <tr className="border-b border-line last:border-b-0">
      <td className="px-4 py-1.5">{time}</td>
      <td className="px-4 py-1.5 italic">
        {element}
        <sub>d</sub>
      </td>
      <td className="px-4 py-1.5 italic">{voigt}</td>
      <td className="px-4 py-1.5 italic">{index}</td>
    </tr>
  );
}
