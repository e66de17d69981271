import fc from 'fast-check'
import { expect, test } from 'vitest'
import { floorShare, litFloor } from '#engine/solar/lit-floor.ts'
import { horizonAt } from '#engine/solar/plane.ts'
import {
  finShare,
  profileAngle,
  shadedHeight,
  sideAngle,
  skyShare,
  sunlitShare,
} from '#engine/solar/shading.ts'
import { incidenceCosine } from '#engine/solar/sun.ts'

const RAD = Math.PI / 180
type Opening = Parameters<typeof sunlitShare>[0]

/** x to the right of the left jamb, z out of the wall, y up; the sill is the origin, the glass leans inwards. */
type Ray = readonly [right: number, up: number, out: number]

const towardsSun = (altitude_deg: number, side_deg: number): Ray => {
  const flat = Math.cos(altitude_deg * RAD)
  return [flat * Math.sin(side_deg * RAD), Math.sin(altitude_deg * RAD), flat * Math.cos(side_deg * RAD)]
}

/** Does a ray from a point of the opening, `along` it from the sill, meet a plate? */
function meetsPlate(opening: Opening, x: number, along: number, [right, up, out]: Ray, tilt_deg: number) {
  const { width_m, height_m, overhang, fins } = opening
  const [sin, cos] = [Math.sin(tilt_deg * RAD), Math.cos(tilt_deg * RAD)]
  if (overhang && up > 0) {
    const root = height_m + overhang.rise_m
    const t = ((root - along) * sin) / up
    const hit = x + right * t
    const beyondRoot = (root - along) * cos + out * t
    const isAcross = hit >= -overhang.extra_m && hit <= width_m + overhang.extra_m
    if (isAcross && beyondRoot >= 0 && beyondRoot <= overhang.depth_m) return true
  }
  if (fins)
    for (const plate of [-fins.gap_m, width_m + fins.gap_m]) {
      const t = (plate - x) / right
      const fromGlass = (out * sin + up * cos) * t
      if (t > 0 && fromGlass >= 0 && fromGlass <= fins.depth_m) return true
    }
  return false
}

function litByRays(opening: Opening, altitude_deg: number, side_deg: number, tilt_deg: number): number {
  const sun = towardsSun(altitude_deg, side_deg)
  const n = 150
  let lit = 0
  for (let i = 0; i < n; i++)
    for (let k = 0; k < n; k++) {
      const [x, along] = [((i + 0.5) / n) * opening.width_m, ((k + 0.5) / n) * opening.height_m]
      if (!meetsPlate(opening, x, along, sun, tilt_deg)) lit++
    }
  return lit / (n * n)
}

const OVERHANGS = [null, { depth_m: 0.9, rise_m: 0.3, extra_m: 0 }, { depth_m: 1.4, rise_m: 0, extra_m: 0.5 }]
const FINS = [null, { depth_m: 0.5, gap_m: 0.1 }, { depth_m: 1, gap_m: 0 }]

for (const tilt_deg of [90, 65, 40])
  test(`the sunlit share of glass at ${tilt_deg} degrees agrees with rays cast from it on overhang and fins`, () => {
    for (const overhang of OVERHANGS)
      for (const fins of FINS) {
        const opening = { width_m: 1.7, height_m: 1.3, overhang, fins }
        for (const altitude of [0.5, 12, 33, 58, 80])
          for (const side of [-115, -81, -50, -17, 0.01, 30, 64]) {
            if (incidenceCosine(altitude, side, tilt_deg, 0) <= 0) continue
            const share = sunlitShare(opening, altitude, side, tilt_deg)
            const where = `${JSON.stringify({ overhang, fins })} altitude ${altitude} side ${side}`
            const rays = litByRays(opening, altitude, side, tilt_deg)
            expect(Math.abs(share - rays), where).toBeLessThan(0.016)
          }
      }
  })

const plates = fc.record({
  width_m: fc.double({ min: 0.3, max: 6, noNaN: true }),
  height_m: fc.double({ min: 0.3, max: 3, noNaN: true }),
  overhang: fc.record({
    depth_m: fc.double({ min: 0, max: 3, noNaN: true }),
    rise_m: fc.double({ min: 0, max: 1, noNaN: true }),
    extra_m: fc.double({ min: 0, max: 2, noNaN: true }),
  }),
  fins: fc.option(
    fc.record({
      depth_m: fc.double({ min: 0, max: 2, noNaN: true }),
      gap_m: fc.double({ min: 0, max: 1, noNaN: true }),
    }),
  ),
})
const altitudes = fc.double({ min: 0.01, max: 89.9, noNaN: true })
const sides = fc.double({ min: -180, max: 180, noNaN: true })
const tilts = fc.double({ min: 30, max: 90, noNaN: true })

test('whatever sun, glass and plates: the sunlit share is within 0 and 1, and the same for a mirrored sun', () => {
  fc.assert(
    fc.property(plates, altitudes, sides, tilts, (opening, altitude, side, tilt) => {
      const share = sunlitShare(opening, altitude, side, tilt)
      expect(share).toBeGreaterThanOrEqual(0)
      expect(share).toBeLessThanOrEqual(1)
      expect(sunlitShare(opening, altitude, -side, tilt)).toBe(share)
    }),
  )
})

test('a deeper overhang, one that goes further aside, or deeper fins never let more sun or sky in', () => {
  const more = fc.double({ min: 0, max: 2, noNaN: true })
  fc.assert(
    fc.property(plates, more, altitudes, sides, tilts, (opening, by, altitude, side, tilt) => {
      const { overhang, fins } = opening
      const share = sunlitShare(opening, altitude, side, tilt)
      const sky = skyShare(opening, tilt)
      for (const deeper of [
        { ...opening, overhang: { ...overhang, depth_m: overhang.depth_m + by } },
        { ...opening, overhang: { ...overhang, extra_m: overhang.extra_m + by } },
        { ...opening, fins: fins ? { ...fins, depth_m: fins.depth_m + by } : { depth_m: by, gap_m: 0 } },
      ]) {
        expect(sunlitShare(deeper, altitude, side, tilt)).toBeLessThanOrEqual(share + 1e-9)
        expect(skyShare(deeper, tilt)).toBeLessThanOrEqual(sky + 1e-9)
        expect(skyShare(deeper, tilt)).toBeGreaterThanOrEqual(0)
      }
    }),
  )
})

test('an overhang that goes far aside shades as an endless one: its shadow over the height, upright or leaning', () => {
  fc.assert(
    fc.property(plates, altitudes, tilts, (opening, altitude, tilt) => {
      const endless = { ...opening, fins: null, overhang: { ...opening.overhang, extra_m: 1e7 } }
      const side = 35
      fc.pre(incidenceCosine(altitude, side, tilt, 0) > 1e-6)
      const dark = shadedHeight(endless, profileAngle(altitude, side), tilt) / opening.height_m
      expect(sunlitShare(endless, altitude, side, tilt)).toBeCloseTo(1 - dark, 9)
    }),
  )
})

/** Share of a uniform sky's light on an opening that the plates leave, by rays weighted with the cosine. */
function skyByRays(opening: Opening, tilt_deg: number): number {
  let seen = 0
  let whole = 0
  for (let altitude = 1; altitude < 90; altitude += 2)
    for (let side = -179; side < 180; side += 2) {
      const cosine = incidenceCosine(altitude, side, tilt_deg, 0)
      if (cosine <= 0) continue
      const weight = Math.cos(altitude * RAD) * cosine
      const sun = towardsSun(altitude, side)
      for (let k = 0; k < 10; k++)
        for (let i = 0; i < 10; i++) {
          whole += weight
          const [x, along] = [((i + 0.5) / 10) * opening.width_m, ((k + 0.5) / 10) * opening.height_m]
          if (!meetsPlate(opening, x, along, sun, tilt_deg)) seen += weight
        }
    }
  return seen / whole
}

const SIZE = { width_m: 1.5, height_m: 1.4 }
const DEEP = { overhang: { depth_m: 0.9, rise_m: 0.3, extra_m: 1e6 }, fins: { depth_m: 0.6, gap_m: 0.1 } }

test('crossed strings give the sky that an endless overhang or endless fins leave, as rays do', () => {
  for (const opening of [
    { ...SIZE, overhang: DEEP.overhang, fins: null },
    { ...SIZE, overhang: null, fins: DEEP.fins },
  ])
    expect(Math.abs(skyShare(opening) - skyByRays(opening, 90))).toBeLessThan(0.01)
  const leaning = { ...SIZE, overhang: DEEP.overhang, fins: null }
  expect(Math.abs(skyShare(leaning, 60) - skyByRays(leaning, 60))).toBeLessThan(0.01)
})

test('overhang and fins together leave about the product of what each leaves', () => {
  const opening = { ...SIZE, ...DEEP }
  expect(Math.abs(skyShare(opening) - skyByRays(opening, 90))).toBeLessThan(0.05)
})

test('without plates the sky and the sun are whole', () => {
  const bare = { ...SIZE, overhang: null, fins: null }
  expect([skyShare(bare), finShare(bare), sunlitShare(bare, 30, 20)]).toEqual([1, 1, 1])
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

test('behind leaning glass each ray of the lit part lands where the share of the floor says', () => {
  const opening = { height_m: 1.6, sill_m: 0.5, overhang: { depth_m: 0.5, rise_m: 0.1, extra_m: 1e6 } }
  const depth_m = 2.2
  for (const tilt of [90, 60, 35])
    for (const profile of [8, 20, 35, 55, 75, 100]) {
      if (profile + tilt >= 180) continue
      const glass = { ...opening, width_m: 1, fins: null }
      // A sun of that profile square to the wall; beyond 90 degrees it stands behind it.
      const [altitude, side] = profile <= 90 ? [profile, 0] : [180 - profile, 180]
      let lit = 0
      let onFloor = 0
      for (let k = 0; k < 4000; k++) {
        const along = ((k + 0.5) / 4000) * opening.height_m
        if (meetsPlate(glass, 0.5, along, towardsSun(altitude, side), tilt)) continue
        lit++
        const height = opening.sill_m + along * Math.sin(tilt * RAD)
        const lands = along * Math.cos(tilt * RAD) + height / Math.tan(profile * RAD)
        if (lands <= depth_m) onFloor++
      }
      if (lit === 0) continue
      const where = `tilt ${tilt} profile ${profile}`
      expect(Math.abs(floorShare(opening, profile, depth_m, tilt) - onFloor / lit), where).toBeLessThan(0.002)
    }
})

test('the horizon is read between its points, around north as well', () => {
  const horizon = [0, 10, 20, 30]
  expect(horizonAt(horizon, 45)).toBeCloseTo(5, 12)
  expect(horizonAt(horizon, 315)).toBeCloseTo(15, 12)
  expect(horizonAt(horizon, -45)).toBeCloseTo(15, 12)
})
