import { ConventionSection, Formula, Fraction } from './ConventionSection.tsx';

const E = <var>E</var>;
const F = <var>F</var>;
const L = <var>L</var>;
const centre = (
  <>
    <var>E</var>
    <sub>0</sub>
  </>
);
const square = <sup>2</sup>;

/** Constants that are given by models, formulas, mixtures and the law of the temperature. */
export function ModelSections() {
  return (
    <>
      <ConventionSection id="index-models" title="Models of the index">
        <p>
          {L} is the vacuum wavelength in µm, {E} the photon energy in eV; energies of terms are in eV. A
          model is used within its stated range only.
        </p>
        <Formula>
          <span className="text-note text-muted">Sellmeier </span>
          <var>n</var>
          {square} = <var>A</var> + Σ{' '}
          <Fraction
            top={
              <>
                <var>b</var>
                {L}
                {square}
              </>
            }
            bottom={
              <>
                {L}
                {square} − <var>c</var>
              </>
            }
          />
          , <var>c</var> in µm{square}
        </Formula>
        <Formula>
          <span className="text-note text-muted">Cauchy </span>
          <var>n</var> = <var>a</var> + <var>b</var>/{L}
          {square} + <var>c</var>/{L}
          <sup>4</sup>, <var>k</var> = <var>k</var>
          <sub>1</sub> exp(<var>β</var>({E} − <var>E</var>
          <sub>1</sub>)) where given
        </Formula>
        <Formula>
          <span className="text-note text-muted">oscillators </span>
          <var>ε</var> = <var>ε</var>
          <sub>∞</sub> + Σ terms, each of them one of
        </Formula>
        <Formula>
          <span className="text-note text-muted">Drude </span>−
          <Fraction
            top={
              <>
                <var>E</var>
                <sub>p</sub>
                {square}
              </>
            }
            bottom={
              <>
                {E}
                {square} + <var>iΓ</var>
                {E}
              </>
            }
          />
          , <span className="text-note text-muted">Lorentz </span>
          <Fraction
            top={
              <>
                <var>f</var>
                {centre}
                {square}
              </>
            }
            bottom={
              <>
                {centre}
                {square} − {E}
                {square} − <var>iΓ</var>
                {E}
              </>
            }
          />
        </Formula>
        <Formula>
          <span className="text-note text-muted">Tauc-Lorentz </span>Im <var>ε</var> ={' '}
          <Fraction
            top={
              <>
                <var>A</var>
                {centre}
                <var>Γ</var>({E} − <var>E</var>
                <sub>g</sub>){square}
              </>
            }
            bottom={
              <>
                ({E}
                {square} − {centre}
                {square}){square} + <var>Γ</var>
                {square}
                {E}
                {square}
              </>
            }
          />{' '}
          <Fraction top="1" bottom={E} /> for {E} &gt; <var>E</var>
          <sub>g</sub>, else 0
        </Formula>
        <p>
          The real part of a Tauc-Lorentz term follows from its imaginary part by causality, in the closed
          form of Jellison and Modine, Appl. Phys. Lett. 69, 371 (1996).
        </p>
      </ConventionSection>

      <ConventionSection id="magneto-optic-lines" title="Lines of Q">
        <p>
          A sum of lines of the photon energy {E}, with {F} = {E} + <var>iΓ</var>, describes either{' '}
          <var>Q</var> or <var>Qε</var>
          <sub>d</sub>; the second is the quantity that causality binds.
        </p>
        <Formula>
          <span className="text-note text-muted">paramagnetic </span>
          <Fraction
            top={
              <>
                <var>A</var>
                {centre}
                {F}
              </>
            }
            bottom={
              <>
                {centre}
                {square} − {F}
                {square}
              </>
            }
          />
          , <span className="text-note text-muted">diamagnetic </span>
          <Fraction
            top={
              <>
                <var>A</var>
                {centre}
                <sup>3</sup>
                {F}
              </>
            }
            bottom={
              <>
                ({centre}
                {square} − {F}
                {square}){square}
              </>
            }
          />
        </Formula>
        <p>
          The first comes from unequal strengths of the transitions of the two circular polarizations, the
          second from their splitting in energy. <var>A</var> is real and has no unit; all energies are in eV.
        </p>
      </ConventionSection>

      <ConventionSection id="user-formulas" title="Formulas of your own">
        <p>
          A formula may use the wavelength <code>L</code> in µm, the photon energy <code>E</code> in eV, its
          coefficients <code>c1</code>, <code>c2</code> and so on and, where its value is complex, the
          imaginary unit <code>i</code>. It gives a real <var>n</var>, a complex <var>N</var> or <var>ε</var>,
          or <var>Q</var>, always with the signs of this page. Only numbers, arithmetic and the usual
          functions are allowed; anything else is refused by name.
        </p>
      </ConventionSection>

      <ConventionSection id="temperature" title="Temperature of a layer">
        <p>
          The magnetization falls with the temperature <var>T</var> as a fraction of that at 0 K, and{' '}
          <var>Q</var> with it:
        </p>
        <Formula>
          <var>m</var>(<var>T</var>) = (1 − (<var>T</var>/<var>T</var>
          <sub>C</sub>)<sup>a</sup>)<sup>b</sup>, <var>Q</var>(<var>T</var>) = <var>Q</var>(<var>T</var>
          <sub>ref</sub>){' '}
          <Fraction
            top={
              <>
                <var>m</var>(<var>T</var>)
              </>
            }
            bottom={
              <>
                <var>m</var>(<var>T</var>
                <sub>ref</sub>)
              </>
            }
          />
        </Formula>
        <p>
          From the Curie temperature <var>T</var>
          <sub>C</sub> on it is 0. <var>T</var>
          <sub>ref</sub> is the temperature at which <var>Q</var> is known and lies below <var>T</var>
          <sub>C</sub>. The parameters are those of a cited source or the user’s own and are stored with the
          layer. <var>N</var> stays as it is: its own change with temperature is not described.
        </p>
      </ConventionSection>

      <ConventionSection id="mixed-materials" title="Mixtures as materials">
        <p>
          Two media mixed far below the wavelength, <var>f</var> the volume fraction of the second. Bruggeman
          treats both alike,
        </p>
        <Formula>
          Σ <var>f</var>
          <sub>j</sub>{' '}
          <Fraction
            top={
              <>
                <var>ε</var>
                <sub>j</sub> − <var>ε</var>
              </>
            }
            bottom={
              <>
                <var>ε</var>
                <sub>j</sub> + 2<var>ε</var>
              </>
            }
          />{' '}
          = 0, <var>Qε</var> ={' '}
          <Fraction
            top={
              <>
                Σ <var>f</var>
                <sub>j</sub>
                <var>Q</var>
                <sub>j</sub>
                <var>ε</var>
                <sub>j</sub>/(<var>ε</var>
                <sub>j</sub> + 2<var>ε</var>){square}
              </>
            }
            bottom={
              <>
                Σ <var>f</var>
                <sub>j</sub>/(<var>ε</var>
                <sub>j</sub> + 2<var>ε</var>){square}
              </>
            }
          />
        </Formula>
        <p>
          with the root of positive imaginary part. Maxwell Garnett has spheres of the second in the first,
          which must not be magnetic; then <var>Qε</var> = <var>Q</var>
          <sub>2</sub>
          <var>ε</var>
          <sub>2</sub> d<var>ε</var>/d<var>ε</var>
          <sub>2</sub>. A mixture kept as a material holds its parts as they were when they were mixed: a
          newer version of a part changes nothing until the mixture is made again.
        </p>
      </ConventionSection>
    </>
  );
}
