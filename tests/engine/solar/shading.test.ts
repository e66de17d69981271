import { expect, test } from 'vitest'
import { floorShare, litFloor } from '#engine/solar/lit-floor.ts'
import { horizonAt } from '#engine/solar/plane.ts'
import { profileAngle, sideAngle, skyShare, sunlitShare } from '#engine/solar/shading.ts'

const RAD = Math.PI / 180
type Opening = Parameters<typeof sunlitShare>[0]

/** Does a ray from a point of the opening meet a plate? x to the right of the left jamb, y up from the sill, z out. */
function meetsPlate(opening: Opening, x: number, y: number, sun: readonly [number, number, number]): boolean {
  const [right, up, out] = sun
  const { width_m, height_m, overhang, fins } = opening
  if (overhang && up > 0) {
    const t = (height_m + overhang.rise_m - y) / up
    const hit = x + right * t
    if (out * t <= overhang.depth_m && hit >= -overhang.extra_m && hit <= width_m + overhang.extra_m)
      return true
  }
  if (fins)
    for (const plate of [-fins.gap_m, width_m + fins.gap_m]) {
      const t = (plate - x) / right
      if (t > 0 && out * t <= fins.depth_m) return true
    }
  return false
}

function litByRays(opening: Opening, altitude_deg: number, side_deg: number): number {
  const flat = Math.cos(altitude_deg * RAD)
  const sun = [
    flat * Math.sin(side_deg * RAD),
    Math.sin(altitude_deg * RAD),
    flat * Math.cos(side_deg * RAD),
  ] as const
  const n = 200
  let lit = 0
  for (let i = 0; i < n; i++)
    for (let k = 0; k < n; k++)
      if (!meetsPlate(opening, ((i + 0.5) / n) * opening.width_m, ((k + 0.5) / n) * opening.height_m, sun))
        lit++
  return lit / (n * n)
}

test('the sunlit share agrees with rays cast from the opening on overhang and fins', () => {
  const overhangs = [
    null,
    { depth_m: 0.9, rise_m: 0.3, extra_m: 0 },
    { depth_m: 1.4, rise_m: 0, extra_m: 0.5 },
  ]
  const allFins = [null, { depth_m: 0.5, gap_m: 0.1 }, { depth_m: 1, gap_m: 0 }]
  for (const overhang of overhangs)
    for (const fins of allFins) {
      const opening = { width_m: 1.7, height_m: 1.3, overhang, fins }
      for (const altitude of [0.5, 12, 33, 58, 80])
        for (const side of [-81, -50, -17, 0.01, 30, 64]) {
          const share = sunlitShare(opening, profileAngle(altitude, side), side)
          const where = `${JSON.stringify({ overhang, fins })} altitude ${altitude} side ${side}`
          expect(Math.abs(share - litByRays(opening, altitude, side)), where).toBeLessThan(0.012)
        }
    }
})

test('a sun mirrored at the facing lights the same share', () => {
  const opening = {
    width_m: 1,
    height_m: 1.2,
    overhang: { depth_m: 0.8, rise_m: 0.1, extra_m: 0.2 },
    fins: { depth_m: 0.3, gap_m: 0.05 },
  }
  for (const side of [10, 40, 70])
    expect(sunlitShare(opening, profileAngle(30, side), side)).toBeCloseTo(
      sunlitShare(opening, profileAngle(30, -side), -side),
      12,
    )
})

/** Share of a uniform sky's light on an upright opening that the plates leave, by rays weighted with the cosine. */
function skyByRays(opening: Opening): number {
  let seen = 0
  let whole = 0
  for (let altitude = 1; altitude < 90; altitude += 2)
    for (let side = -89; side < 90; side += 2) {
      const flat = Math.cos(altitude * RAD)
      const weight = flat * flat * Math.cos(side * RAD)
      const sun = [
        flat * Math.sin(side * RAD),
        Math.sin(altitude * RAD),
        flat * Math.cos(side * RAD),
      ] as const
      for (let k = 0; k < 12; k++)
        for (let i = 0; i < 12; i++) {
          whole += weight
          const x = ((i + 0.5) / 12) * opening.width_m
          const y = ((k + 0.5) / 12) * opening.height_m
          if (!meetsPlate(opening, x, y, sun)) seen += weight
        }
    }
  return seen / whole
}

test('crossed strings give the sky that an endless overhang or endless fins leave, as rays do', () => {
  const overhang = { depth_m: 0.9, rise_m: 0.3, extra_m: 1e6 }
  const fins = { depth_m: 0.6, gap_m: 0.1 }
  const size = { width_m: 1.5, height_m: 1.4 }
  for (const opening of [
    { ...size, overhang, fins: null },
    { ...size, overhang: null, fins },
  ])
    expect(Math.abs(skyShare(opening) - skyByRays(opening))).toBeLessThan(0.01)
})

test('overhang and fins together leave about the product of what each leaves', () => {
  const opening = {
    width_m: 1.5,
    height_m: 1.4,
    overhang: { depth_m: 0.9, rise_m: 0.3, extra_m: 1e6 },
    fins: { depth_m: 0.6, gap_m: 0.1 },
  }
  expect(Math.abs(skyShare(opening) - skyByRays(opening))).toBeLessThan(0.05)
})

test('azimuths are told from the facing across north', () => {
  expect(sideAngle(350, 10)).toBeCloseTo(-20, 12)
  expect(sideAngle(10, 350)).toBeCloseTo(20, 12)
})

test('the patch on the floor lies between sill and lit head over the tangent of the profile angle', () => {
  const opening = { height_m: 1.5, sill_m: 0.6, overhang: { depth_m: 0.9, rise_m: 0.3, extra_m: 0 } }
  // Winter noon at 40° north: the shadow takes 0.150 m off the top (overhang geometry of the shading evidence).
  const patch = litFloor(opening, 26.55)!
  expect(patch.toHeight_m).toBeCloseTo(1.95, 3)
  // (2.4 - (0.9 tan p) ) / tan p: the rise cancels against the head, 0.6 + 1.5 + 0.3.
  expect(patch.to_m).toBeCloseTo(2.4 / Math.tan(26.55 * RAD) - 0.9, 9)
  expect(patch.from_m).toBeCloseTo(0.6 / Math.tan(26.55 * RAD), 9)
  expect(litFloor(opening, 73.45)).toBeNull()
  expect(litFloor(opening, -1)).toBeNull()
  expect(floorShare(opening, 26.55, 20)).toBe(1)
  expect(floorShare(opening, 26.55, 1)).toBe(0)
})

test('the horizon is read between its points, around north as well', () => {
  const horizon = [0, 10, 20, 30]
  expect(horizonAt(horizon, 45)).toBeCloseTo(5, 12)
  expect(horizonAt(horizon, 315)).toBeCloseTo(15, 12)
  expect(horizonAt(horizon, -45)).toBeCloseTo(15, 12)
})
