import { ConventionSection, Formula, Fraction } from './ConventionSection.tsx';

/** What the constants of other sources are turned into. */
export function ImportSections() {
  return (
    <>
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
          <sub>d</sub>).
        </p>
        <p>The other questions of an import:</p>
        <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-1.5 max-sm:grid-cols-1">
          <dt className="text-muted">
            <var>m</var> along −<var>z</var> of the tensor
          </dt>
          <dd>
            <var>Q</var>, <var>ε</var>
            <sub>xy</sub> and <var>σ</var>
            <sub>xy</sub> change sign; where the <var>z</var> of the source points does not matter, since a
            tensor stays the same when <var>z</var> and <var>m</var> turn around together
          </dd>
          <dt className="text-muted">field out of the film</dt>
          <dd>both Kerr angles change sign</dd>
          <dt className="text-muted">rotation clockwise</dt>
          <dd>the rotation changes sign; here it is positive counter-clockwise, looking into the beam</dd>
          <dt className="text-muted">ellipticity clockwise</dt>
          <dd>the ellipticity changes sign, whatever the rotation does</dd>
          <dt className="text-muted">permittivity</dt>
          <dd>
            <var>N</var> = √(<var>ε</var>
            <sub>1</sub> + <var>iε</var>
            <sub>2</sub>), the root with <var>n</var> ≥ 0; conjugated for exp(+<var>iωt</var>)
          </dd>
        </dl>
      </ConventionSection>

      <ConventionSection id="bulk-kerr" title="From a measured Kerr angle to Q">
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
          <var>N</var>
          <sub>0</sub> is the index that light comes from. <var>Q</var> is found by Newton steps from the
          first-order value, and the exact ratio of the found <var>Q</var> is the entered one again.
        </p>
      </ConventionSection>

      <ConventionSection id="kerr-tables" title="From a conductivity to Q">
        <p>
          A conductivity, for exp(−<var>iωt</var>), gives <var>ε</var>
          <sub>xy</sub> = <var>iσ</var>
          <sub>xy</sub>/(<var>ε</var>
          <sub>0</sub>
          <var>ω</var>) in SI units and 4π<var>iσ</var>
          <sub>xy</sub>/<var>ω</var> in CGS units.
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
