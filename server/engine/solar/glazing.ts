import type { GlazingData } from '../zone/house-model.ts'

const RAD = Math.PI / 180

/** A pane of clear glass without coating. */
export interface Pane {
  readonly thickness_m: number
  /** Extinction coefficient of the glass [1/m]. */
  readonly extinction_m: number
  readonly refractiveIndex: number
}

/** What becomes of sunlight on a stack of panes; shares of what arrives, which sum to 1. */
export interface StackOptics {
  readonly transmittance: number
  readonly reflectance: number
  /** By pane, the outermost first. */
  readonly absorptance: readonly number[]
}

/**
 * Transmittance, reflectance and absorptance of parallel panes for unpolarized light: Fresnel's reflection at
 * each face, absorption on the way through, all reflections back and forth, for each polarization by itself.
 *
 * Source: J. A. Duffie and W. A. Beckman, Solar Engineering of Thermal Processes, sections 5.1 to 5.3, and
 * for stacks the same sums written as a recursion (from memory).
 *
 * @param panes the outermost first, at least one
 * @param incidence_deg angle of incidence, 0 to 90
 */
export function stackOptics(panes: readonly Pane[], incidence_deg: number): StackOptics {
  const absorptance = panes.map(() => 0)
  if (incidence_deg >= 90) return { transmittance: 0, reflectance: 1, absorptance }
  let transmittance = 0
  let reflectance = 0
  for (const polarization of [0, 1]) {
    const each = panes.map((pane) => paneOptics(pane, incidence_deg)[polarization])
    // Reflectance, seen from outside, of the panes further in than the i-th.
    const behind = panes.map(() => 0)
    let whole = 0
    for (let i = panes.length - 1; i >= 0; i--) {
      behind[i] = whole
      whole = each[i].back + (each[i].through ** 2 * whole) / (1 - each[i].back * whole)
    }
    let arriving = 1
    for (let i = 0; i < panes.length; i++) {
      const { through, back } = each[i]
      const leaving = (through * arriving) / (1 - back * behind[i])
      absorptance[i] += 0.5 * (1 - through - back) * (arriving + behind[i] * leaving)
      arriving = leaving
    }
    transmittance += 0.5 * arriving
    reflectance += 0.5 * whole
  }
  return { transmittance, reflectance, absorptance }
}

/** A single pane for light across and along the plane of incidence. */
function paneOptics(pane: Pane, incidence_deg: number): { through: number; back: number }[] {
  const sine = Math.sin(incidence_deg * RAD) / pane.refractiveIndex
  const outside = Math.cos(incidence_deg * RAD)
  const inside = Math.sqrt(1 - sine * sine)
  const passed = Math.exp((-pane.extinction_m * pane.thickness_m) / inside)
  const n = pane.refractiveIndex
  return [
    ((outside - n * inside) / (outside + n * inside)) ** 2,
    ((n * outside - inside) / (n * outside + inside)) ** 2,
  ].map((face) => {
    const through = ((1 - face) ** 2 * passed) / (1 - (face * passed) ** 2)
    return { through, back: face * (1 + passed * through) }
  })
}

/** Conductances between the glass, the air outside and the room [W/(m² K)]. */
export interface StackConductance {
  readonly outside_Wm2K: number
  readonly inside_Wm2K: number
  /** Between neighbouring panes. */
  readonly gap_Wm2K: number
  /** Through a pane from face to face. */
  readonly pane_Wm2K: number
}

/**
 * U-value of a stack, and the share of the heat absorbed in each pane that flows inwards: the resistance from
 * the pane's middle to the outdoor air as a share of the whole.
 */
export function stackHeat(
  panes: number,
  { outside_Wm2K, inside_Wm2K, gap_Wm2K, pane_Wm2K }: StackConductance,
): { readonly u_Wm2K: number; readonly inwardShare: readonly number[] } {
  const whole = 1 / outside_Wm2K + panes / pane_Wm2K + (panes - 1) / gap_Wm2K + 1 / inside_Wm2K
  const inwardShare = Array.from(
    { length: panes },
    (_, i) => (1 / outside_Wm2K + (i + 0.5) / pane_Wm2K + i / gap_Wm2K) / whole,
  )
  return { u_Wm2K: 1 / whole, inwardShare }
}

/** Mean over the half space of light from everywhere alike, 2 ∫ f sin θ cos θ dθ (Simpson, half degrees). */
export function hemispherical(byAngle: (incidence_deg: number) => number): number {
  const steps = 180
  let sum = 0
  for (let i = 1; i < steps; i++) {
    const angle_deg = (i * 90) / steps
    sum += (i % 2 === 1 ? 4 : 2) * byAngle(angle_deg) * Math.sin(2 * angle_deg * RAD)
  }
  return (sum * (Math.PI / 2 / steps)) / 3
}

/** Glazing data of uncoated panes, from optics and conductances alone. */
export function clearGlazing(panes: readonly Pane[], conductance: StackConductance): GlazingData {
  const { u_Wm2K, inwardShare } = stackHeat(panes.length, conductance)
  const transmittance = (angle_deg: number) => stackOptics(panes, angle_deg).transmittance
  const solarFactor = (angle_deg: number) => {
    const optics = stackOptics(panes, angle_deg)
    return optics.absorptance.reduce((sum, share, i) => sum + share * inwardShare[i], optics.transmittance)
  }
  return {
    u_Wm2K,
    transmittance: TENS_DEG.map(transmittance),
    solarFactor: TENS_DEG.map(solarFactor),
    diffuseTransmittance: hemispherical(transmittance),
    diffuseSolarFactor: hemispherical(solarFactor),
  }
}

const TENS_DEG = [0, 10, 20, 30, 40, 50, 60, 70, 80, 90]

/** Common window glass, 3 mm, with the refractive index of Duffie and Beckman and a middling extinction. */
const WINDOW_PANE: Pane = { thickness_m: 0.003, extinction_m: 19.6, refractiveIndex: 1.526 }
const WINDOW_CONDUCTANCE: StackConductance = {
  outside_Wm2K: 21,
  inside_Wm2K: 8.29,
  gap_Wm2K: 6.3,
  pane_Wm2K: 333,
}

/**
 * Glazing data from the few numbers a catalogue prints. Transmittance and solar factor at normal incidence are
 * the given ones; over the angle both follow the curves of as many clear panes, scaled. Tables of the ASHRAE
 * Handbook of Fundamentals, as remembered, lie up to 0.04 lower for two panes and 0.06 for three, near 60 to
 * 80 degrees: they follow when the polarizations are averaged pane by pane, which loses light that stays
 * polarized.
 *
 * @param u_Wm2K air to air
 * @param g solar factor at normal incidence
 * @param panes number of panes in the light's way
 * @param directShare share of g that is light let through; that of clear panes where it is not known
 */
export function catalogueGlazing(
  u_Wm2K: number,
  g: number,
  panes: number,
  directShare?: number,
): GlazingData {
  const shape = clearGlazing(Array<Pane>(panes).fill(WINDOW_PANE), WINDOW_CONDUCTANCE)
  const whole = g / shape.solarFactor[0]
  const direct = directShare === undefined ? whole : (directShare * g) / shape.transmittance[0]
  return {
    u_Wm2K,
    transmittance: shape.transmittance.map((value) => value * direct),
    solarFactor: shape.solarFactor.map((value) => value * whole),
    diffuseTransmittance: shape.diffuseTransmittance * direct,
    diffuseSolarFactor: shape.diffuseSolarFactor * whole,
  }
}
