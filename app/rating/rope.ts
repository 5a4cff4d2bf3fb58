/** Standard gravity as the calculations use it, m/s². */
const gravity = 9.81
const standardMass = 80
const standardFactor = 1.77

/** A rope's modulus in newtons from its rated impact force in newtons (EN 892: 80 kg, fall factor 1.77). */
export function toRopeModulus(impactForce: number): number {
  const weight = standardMass * gravity
  return (impactForce * (impactForce - 2 * weight)) / (2 * weight * standardFactor)
}

/** The impact force in newtons of a fall: T = mg + √((mg)² + 2 m g f K). Wexler 1950; Goldstone, The standard equation. */
export function toImpactForce(fall: { massKg: number; factor: number; modulus: number }): number {
  const weight = fall.massKg * gravity
  return weight + Math.sqrt(weight * weight + 2 * weight * fall.factor * fall.modulus)
}

/**
 * The fall factor that counts when friction over the top connector shortens the rope that works: h/(L₁ + r L₂ + slack),
 * metres; r is the tension ratio belayer to climber. Derived here, quasi-static.
 */
export function toEffectiveFactor(fall: {
  height: number
  climberSide: number
  belayerSide: number
  slack: number
  r: number
}): number {
  return fall.height / (fall.climberSide + fall.r * fall.belayerSide + fall.slack)
}
