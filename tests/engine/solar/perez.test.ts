import { expect, test } from 'vitest'
import { airMass, perezShares } from '#engine/solar/perez.ts'
import { evidenceInputs } from '../../../server/evidence/inputs.ts'

const RAD = Math.PI / 180
const table = evidenceInputs.published('perez-coefficients.csv')

test('the sky changes its bin of coefficients where (B/D) / (1 + 1.041 z³) passes the printed bounds (Perez et al. 1990)', () => {
  const zenith_deg = 60
  const cube = 1.041 * (zenith_deg * RAD) ** 3
  const diffuse = 100
  const brightness = (diffuse * airMass(zenith_deg)) / 1367
  const expected = (bin: number) => {
    const c = (name: string) => Number(table[bin][name])
    return {
      circumsolar: Math.max(0, c('F11') + c('F12') * brightness + c('F13') * zenith_deg * RAD),
      horizon: c('F21') + c('F22') * brightness + c('F23') * zenith_deg * RAD,
    }
  }
  expect(table.length).toBe(8)
  for (let bin = 0; bin < 7; bin++) {
    const bound = diffuse * (Number(table[bin].clearness_below) - 1) * (1 + cube)
    for (const [beam, where] of [
      [bound * 0.999, bin],
      [bound * 1.001, bin + 1],
    ]) {
      const shares = perezShares(diffuse, beam, 1367, zenith_deg)
      expect(shares.circumsolar, `bin ${where}`).toBeCloseTo(expected(where).circumsolar, 12)
      expect(shares.horizon, `bin ${where}`).toBeCloseTo(expected(where).horizon, 12)
    }
  }
})

test('no share of the sky around the sun is negative, down to the horizon', () => {
  for (const zenith of [0, 45, 80, 89, 90, 90.4])
    for (const beam of [0, 10, 200, 900])
      for (const diffuse of [0.5, 20, 150, 500]) {
        const { circumsolar, horizon } = perezShares(diffuse, beam, 1400, zenith)
        expect(circumsolar).toBeGreaterThanOrEqual(0)
        expect(Number.isFinite(horizon)).toBe(true)
      }
})

test('air mass is about one overhead and about 38 on the horizon, and no more below it (Kasten and Young 1989)', () => {
  expect(airMass(0)).toBeCloseTo(1, 3)
  expect(airMass(90)).toBeCloseTo(37.92, 2)
  expect(airMass(95)).toBe(airMass(90))
})
