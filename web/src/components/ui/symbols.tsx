/** Symbols of the trade, set by markup: our faces lack most sub- and superscript characters. */

export const OmegaH2 = () => (
  <i className="font-serif">
    Ω<sub>χ</sub>h<sup>2</sup>
  </i>
)

export const GRho = () => (
  <i className="font-serif">
    g<sub>ρ</sub>
  </i>
)

export const GS = () => (
  <i className="font-serif">
    g<sub>s</sub>
  </i>
)

export const NEff = () => (
  <span className="font-serif">
    <i>N</i>
    <sub>eff</sub>
  </span>
)

export const SigmaV = () => <i className="font-serif">⟨σv⟩</i>

export const XF = () => (
  <i className="font-serif">
    x<sub>f</sub>
  </i>
)
