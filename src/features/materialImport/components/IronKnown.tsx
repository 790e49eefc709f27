/** Fe at 632.8 nm from N = 2.87 + 3.36i and Q = 0.0376 + 0.0066i: Zak et al., Phys. Rev. B 43, 6423 (1991). */
export function IronKnown() {
  return (
    <p>
      A sample that is known settles it: bulk iron at 632.8 nm and normal incidence, magnetized into the film,
      has a rotation near +0.33° and an ellipticity near +0.36° in the signs of this program (from constants
      of Zak et al., Phys. Rev. B 43, 6423 (1991)). If the same source reports iron with the other sign, take
      the other choice here.
    </p>
  );
}
