import { expect, test } from 'vitest'
import { atIncidence } from '#engine/solar/at-incidence.ts'
import {
  catalogueGlazing,
  clearGlazing,
  hemispherical,
  stackHeat,
  stackOptics,
} from '#engine/solar/glazing.ts'
import { loadLibrary } from '../../../server/libraries/library.ts'

const PANE = { thickness_m: 0.003, extinction_m: 19.6, refractiveIndex: 1.526 }
const FILMS = { outside_Wm2K: 21, inside_Wm2K: 8.29, gap_Wm2K: 6.3, pane_Wm2K: 333 }

test('light on one to four panes is let through, thrown back or absorbed, at every angle', () => {
  for (let panes = 1; panes <= 4; panes++)
    for (let angle = 0; angle <= 90; angle += 5) {
      const { transmittance, reflectance, absorptance } = stackOptics(Array(panes).fill(PANE), angle)
      expect(transmittance + reflectance + absorptance.reduce((a, b) => a + b)).toBeCloseTo(1, 12)
      expect(Math.min(transmittance, reflectance, ...absorptance)).toBeGreaterThanOrEqual(0)
    }
})

test('panes without absorption throw back Fresnel reflection of (1 - r) / (1 + (2N - 1) r), Duffie and Beckman', () => {
  const clear = { ...PANE, extinction_m: 0 }
  const r = (0.526 / 2.526) ** 2
  for (const n of [1, 2, 3])
    expect(stackOptics(Array(n).fill(clear), 0).transmittance).toBeCloseTo(
      (1 - r) / (1 + (2 * n - 1) * r),
      12,
    )
})

test('the mean over the half space of a cosine is two thirds, of a constant itself', () => {
  expect(hemispherical((angle) => Math.cos((angle * Math.PI) / 180))).toBeCloseTo(2 / 3, 6)
  expect(hemispherical(() => 0.5)).toBeCloseTo(0.5, 6)
})

test('between the ten angles the curve keeps within 0.01 of Fresnel at 5, 15, … 85 degrees and never rises', () => {
  for (let n = 1; n <= 3; n++) {
    const panes = Array<typeof PANE>(n).fill(PANE)
    const { transmittance } = clearGlazing(panes, FILMS)
    for (let angle = 5; angle < 90; angle += 10)
      expect(
        Math.abs(atIncidence(transmittance, angle) - stackOptics(panes, angle).transmittance),
      ).toBeLessThan(0.01)
    for (let angle = 0; angle < 90; angle++)
      expect(atIncidence(transmittance, angle + 1)).toBeLessThanOrEqual(atIncidence(transmittance, angle))
    expect(atIncidence(transmittance, 90)).toBe(0)
  }
})

test('averaged pane by pane, the polarizations give the handbook’s rows 5a and 29a (ASHRAE 2005, from memory) within 0.013', () => {
  // The sums that the program does not use: each pane's light averaged over both polarizations, then stacked.
  const averaged = (panes: number, angle: number) => {
    const one = stackOptics([{ ...PANE, extinction_m: 30 }], angle)
    const behind = Array<number>(panes).fill(0)
    for (let i = panes - 2; i >= 0; i--)
      behind[i] =
        one.reflectance + (one.transmittance ** 2 * behind[i + 1]) / (1 - one.reflectance * behind[i + 1])
    const { inwardShare } = stackHeat(panes, FILMS)
    let arriving = 1
    let inwards = 0
    for (let i = 0; i < panes; i++) {
      const leaving = (one.transmittance * arriving) / (1 - one.reflectance * behind[i])
      inwards += inwardShare[i] * one.absorptance[0] * (arriving + behind[i] * leaving)
      arriving = leaving
    }
    return arriving + inwards
  }
  const rows = [
    [2, 0.74, 0.71, 0.64, 0.5, 0.26],
    [3, 0.65, 0.62, 0.54, 0.39, 0.18],
  ]
  for (const [panes, ...printed] of rows)
    [40, 50, 60, 70, 80].forEach((angle, i) =>
      expect(Math.abs(averaged(panes, angle) - printed[i]), `${panes} panes, ${angle}°`).toBeLessThan(0.013),
    )
})

test('rows of the glazing library are the catalogue curves of their U and g, or the panes of the test box', () => {
  for (const row of loadLibrary().glazings.values()) {
    const { panes, directShare } = row as unknown as { panes: number; directShare?: number }
    const boxPane = { ...PANE, thickness_m: 0.003175 }
    const expected =
      row.id === 'test_box_2001'
        ? clearGlazing([boxPane, boxPane], { ...FILMS, gap_Wm2K: 6.297 })
        : catalogueGlazing(row.u_Wm2K, row.solarFactor[0], panes, directShare)
    for (let i = 0; i < 10; i++) {
      expect(Math.abs(row.transmittance[i] - expected.transmittance[i]), row.id).toBeLessThan(1e-4)
      expect(Math.abs(row.solarFactor[i] - expected.solarFactor[i]), row.id).toBeLessThan(1e-4)
      expect(row.solarFactor[i], row.id).toBeGreaterThanOrEqual(row.transmittance[i])
    }
    expect(Math.abs(row.diffuseSolarFactor - expected.diffuseSolarFactor)).toBeLessThan(1e-4)
    expect(Math.abs(row.diffuseTransmittance - expected.diffuseTransmittance)).toBeLessThan(1e-4)
  }
})
