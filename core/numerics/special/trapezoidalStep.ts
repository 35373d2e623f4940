/**
 * Step of the trapezoidal rule for ∫ exp(−z cosh t) … dt that leaves an error near 1e-16.
 * For small z the strip of analyticity |Im t| < π/2 decides: error e^{−π²/h}. For large z the integrand is a Gaussian of
 * width 1/√z: error e^{−2π²/(z h²)}.
 */
export function trapezoidalStep(z: number): number {
  return Math.min(0.2, 0.65 / Math.sqrt(z))
}
