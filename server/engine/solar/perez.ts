const RAD = Math.PI / 180

/** Upper bounds of the sky clearness bins. */
const CLEARNESS = [1.065, 1.23, 1.5, 1.95, 2.8, 4.5, 6.2]

/** F11 F12 F13 F21 F22 F23 by bin: Perez et al. 1990, table 6, all sites composite. */
export const PEREZ_1990: readonly (readonly number[])[] = [
  [-0.008, 0.588, -0.062, -0.06, 0.072, -0.022],
  [0.13, 0.683, -0.151, -0.019, 0.066, -0.029],
  [0.33, 0.487, -0.221, 0.055, -0.064, -0.026],
  [0.568, 0.187, -0.295, 0.109, -0.152, -0.014],
  [0.873, -0.392, -0.362, 0.226, -0.462, 0.001],
  [1.132, -1.237, -0.412, 0.288, -0.823, 0.056],
  [1.06, -1.6, -0.359, 0.264, -1.127, 0.131],
  [0.678, -0.327, -0.25, 0.156, -1.377, 0.251],
]

/** Relative optical air mass (Kasten and Young 1989), for zenith angles up to 90° [deg]. */
export function airMass(zenith_deg: number): number {
  const z = Math.min(zenith_deg, 90)
  return 1 / (Math.cos(z * RAD) + 0.50572 * (96.07995 - z) ** -1.6364)
}

export interface SkyShares {
  /** Share of the diffuse that comes from around the sun, and of the horizon band. */
  readonly circumsolar: number
  readonly horizon: number
}

/**
 * Brightening around the sun and at the horizon.
 *
 *   ε = ((D + B)/D + 1.041 z³) / (1 + 1.041 z³),   Δ = D m / E0
 *   F1 = max(0, F11 + F12 Δ + F13 z),   F2 = F21 + F22 Δ + F23 z
 *
 * Source: R. Perez et al., Solar Energy 44(5), 1990, equations 1 to 9.
 *
 * @param diffuse_Wm2  horizontal, more than 0
 * @param beam_Wm2     normal
 * @param extraterrestrial_Wm2 normal
 */
export function perezShares(
  diffuse_Wm2: number,
  beam_Wm2: number,
  extraterrestrial_Wm2: number,
  zenith_deg: number,
  mass = airMass(zenith_deg),
): SkyShares {
  const z = zenith_deg * RAD
  const cube = 1.041 * z * z * z
  const clearness = ((diffuse_Wm2 + beam_Wm2) / diffuse_Wm2 + cube) / (1 + cube)
  let bin = 0
  while (bin < 7 && clearness >= CLEARNESS[bin]) bin++
  const f = PEREZ_1990[bin]
  const brightness = (diffuse_Wm2 * mass) / extraterrestrial_Wm2
  return {
    circumsolar: Math.max(0, f[0] + f[1] * brightness + f[2] * z),
    horizon: f[3] + f[4] * brightness + f[5] * z,
  }
}
