import { expect, test } from 'vitest'
import { HOURS, type ClimateYear } from '#engine/climate/climate-year.ts'
import { catalogueGlazing } from '#engine/solar/glazing.ts'
import { horizonAt, planeIrradiance } from '#engine/solar/plane.ts'
import { incidenceCosine, sunOfYear, type SunYear } from '#engine/solar/sun.ts'
import { windowSun } from '#engine/solar/window-sun.ts'
import type { WindowModel } from '#engine/zone/house-model.ts'

const RAD = Math.PI / 180
const GROUND = Array<number>(12).fill(0.2)
const place = { name: 'Point', latitude_deg: 40, longitude_deg: 0, elevation_m: 0, timeZone_h: 0 }
const sun = sunOfYear(place)
const all = (value: (hour: number) => number) =>
  Float64Array.from({ length: HOURS }, (_, hour) => value(hour))

/** A clear sky: beam 700 W/m² and diffuse 100 W/m² while the sun is up. */
const beam_Wm2 = all((hour) => 700 * sun.sunlit[hour])
const diffuse_Wm2 = all((hour) => 100 * sun.sunlit[hour])
const climate: ClimateYear = {
  place,
  source: 'clear at every hour',
  outdoor_C: all(() => 10),
  dewPoint_C: all(() => 0),
  wind_ms: all(() => 0),
  pressure_Pa: all(() => 101325),
  beam_Wm2,
  diffuse_Wm2,
  global_Wm2: all(
    (hour) => diffuse_Wm2[hour] + beam_Wm2[hour] * Math.max(0, Math.sin(sun.altitude_deg[hour] * RAD)),
  ),
  sky_C: all(() => 0),
}

const windowFacing = (faces_deg: number, more: Partial<WindowModel> = {}): WindowModel => ({
  name: 'window',
  area_m2: 2,
  frameShare: 0.25,
  frameU_Wm2K: 2,
  glazing: catalogueGlazing(1.2, 0.62, 2, 0.88),
  exposure: {
    tilt_deg: 90,
    faces_deg,
    solarAbsorptance: 0,
    emittance: 0.84,
    film_Wm2K: 20,
    radiative_Wm2K: 4,
    evaporativeShare: 0,
  },
  convective_Wm2K: 3,
  radiative_Wm2K: 5,
  width_m: 2,
  height_m: 1,
  sill_m: 0.8,
  overhang: null,
  fins: null,
  shutter: null,
  shade: null,
  ...more,
})

const sum = (values: Float64Array) => values.reduce((total, value) => total + value, 0)
const through = (window: WindowModel, horizon: number[] = []) =>
  windowSun(climate, sun, window, GROUND, horizon, 4)

test('under a sky alike in the morning and the evening, east and west windows get the same year', () => {
  const east = through(windowFacing(90))
  const west = through(windowFacing(270))
  const ratio = sum(east.transmittedBeam_W) / sum(west.transmittedBeam_W)
  expect(Math.abs(ratio - 1)).toBeLessThan(0.01)
  expect(Math.abs(sum(east.floorShare) / sum(west.floorShare) - 1)).toBeLessThan(0.02)
})

/** The same hours backwards, day by day, under a sun mirrored from east to west. */
const backwards = (values: Float64Array) =>
  all((hour) => values[24 * Math.floor(hour / 24) + 23 - (hour % 24)])
const mirroredSun: SunYear = {
  altitude_deg: backwards(sun.altitude_deg),
  azimuth_deg: backwards(sun.azimuth_deg.map((azimuth) => 360 - azimuth)),
  sunlit: backwards(sun.sunlit),
  extraterrestrial_Wm2: backwards(sun.extraterrestrial_Wm2),
}
const mirroredClimate: ClimateYear = {
  ...climate,
  beam_Wm2: backwards(beam_Wm2),
  diffuse_Wm2: backwards(diffuse_Wm2),
  global_Wm2: backwards(climate.global_Wm2),
}

test('mirrored about noon, east and west windows trade places hour by hour, with plates, lean and horizon', () => {
  const plates = {
    overhang: { depth_m: 0.6, rise_m: 0.1, extra_m: 0.2 },
    fins: { depth_m: 0.3, gap_m: 0.05 },
  }
  const horizon = Array.from({ length: 36 }, (_, i) => 10 + 9 * Math.sin(i))
  const mirroredHorizon = horizon.map((_, i) => horizon[(36 - i) % 36])
  for (const [faces_deg, tilt_deg] of [
    [90, 90],
    [140, 60],
  ]) {
    const one = windowFacing(faces_deg, plates)
    const other = windowFacing(360 - faces_deg, plates)
    const lean = (window: WindowModel) => ({ ...window, exposure: { ...window.exposure, tilt_deg } })
    const here = windowSun(climate, sun, lean(one), GROUND, horizon, 4)
    const there = windowSun(mirroredClimate, mirroredSun, lean(other), GROUND, mirroredHorizon, 4)
    expect(sum(here.transmittedBeam_W)).toBeGreaterThan(1e5)
    for (const name of ['transmittedBeam_W', 'transmittedDiffuse_W', 'inward_W', 'floorShare'] as const) {
      const turned = backwards(there[name])
      for (let hour = 0; hour < HOURS; hour++)
        if (!(Math.abs(here[name][hour] - turned[hour]) < 1e-6))
          expect.fail(`${name} at hour ${hour}: ${here[name][hour]} and ${turned[hour]}`)
    }
  }
})

test('fins take their share of the ground’s light as of the sky’s', () => {
  const fins = { depth_m: 0.6, gap_m: 0.1 }
  const night = { ...climate, beam_Wm2: all(() => 0), diffuse_Wm2: all(() => 0), global_Wm2: all(() => 100) }
  const lit = (window: WindowModel) => sum(windowSun(night, sun, window, GROUND, [], 4).transmittedDiffuse_W)
  const left = lit(windowFacing(180, { fins })) / lit(windowFacing(180))
  // Crossed strings: each fin has (w + near - far) / 2w of the view.
  const near = Math.hypot(0.1, 0.6)
  const far = Math.hypot(2.1, 0.6)
  expect(left).toBeCloseTo(1 - (2 + near - far) / 2, 9)
})

test('without sun or light nothing comes in, and a plane known already gives the same window', () => {
  const dark = { ...climate, beam_Wm2: all(() => 0), diffuse_Wm2: all(() => 0), global_Wm2: all(() => 0) }
  const none = windowSun(dark, sun, windowFacing(180), GROUND, [], 4)
  expect(sum(none.transmittedBeam_W) + sum(none.transmittedDiffuse_W) + sum(none.inward_W)).toBe(0)
  const window = windowFacing(150)
  const plane = planeIrradiance(climate, sun, window.exposure, GROUND, [])
  expect(windowSun(climate, sun, window, GROUND, [], 4, plane)).toEqual(through(window))
})

test('a window never lets in more than its solar factor of what meets its glass, nor less than nothing', () => {
  for (const faces_deg of [0, 90, 180, 300]) {
    const window = windowFacing(faces_deg)
    const plane = planeIrradiance(climate, sun, window.exposure, GROUND, [])
    const got = through(window)
    for (let hour = 0; hour < HOURS; hour++) {
      const meets_W = 1.5 * (plane.beam_Wm2[hour] + plane.sky_Wm2[hour] + plane.ground_Wm2[hour])
      const in_W = got.transmittedBeam_W[hour] + got.transmittedDiffuse_W[hour] + got.inward_W[hour]
      const isWithin =
        got.inward_W[hour] >= 0 && got.transmittedBeam_W[hour] >= 0 && in_W <= 0.62 * meets_W + 1e-9
      if (!isWithin) expect.fail(`hour ${hour} facing ${faces_deg}: ${in_W} W of ${meets_W} W`)
      const share = got.floorShare[hour]
      if (!(share >= 0 && share <= 1)) expect.fail(`hour ${hour}: share ${share}`)
    }
  }
})

test('no beam exceeds what the sun and the circumsolar sky can give, in sunrise hours as well', () => {
  const plane = planeIrradiance(climate, sun, { tilt_deg: 90, faces_deg: 90 }, GROUND, [])
  // All diffuse light from around the sun, at the least cosine that is divided by, on top of the beam.
  const most = (hour: number) =>
    beam_Wm2[hour] + diffuse_Wm2[hour] / Math.max(Math.cos(85 * RAD), Math.sin(sun.altitude_deg[hour] * RAD))
  for (let hour = 0; hour < HOURS; hour++)
    if (!(plane.beam_Wm2[hour] <= most(hour) + 1e-9))
      expect.fail(`hour ${hour}: ${plane.beam_Wm2[hour]} W/m²`)
})

test('a shade that passes a third in summer leaves a third then and all in winter', () => {
  const bare = through(windowFacing(180))
  const shaded = through(windowFacing(180, { shade: { passes: 1 / 3, months: [6, 7, 8] } }))
  const july = 24 * 190 + 12
  const january = 24 * 10 + 12
  expect(shaded.transmittedBeam_W[july] * 3).toBeCloseTo(bare.transmittedBeam_W[july], 9)
  expect(shaded.transmittedBeam_W[january]).toBe(bare.transmittedBeam_W[january])
})

test('a horizon at 25 degrees takes the winter mornings and leaves a level plane cos² 25° of the sky', () => {
  const horizon = Array<number>(36).fill(25)
  const open = planeIrradiance(climate, sun, { tilt_deg: 0, faces_deg: 0 }, GROUND, [])
  const closed = planeIrradiance(climate, sun, { tilt_deg: 0, faces_deg: 0 }, GROUND, horizon)
  for (let hour = 0; hour < HOURS; hour++)
    expect(closed.beam_Wm2[hour]).toBe(sun.altitude_deg[hour] < 25 ? 0 : open.beam_Wm2[hour])
  expect(sum(closed.sky_Wm2) / sum(open.sky_Wm2)).toBeCloseTo(Math.cos(25 * RAD) ** 2, 9)
})

test('an upright plane keeps 1 - (2h + sin 2h) / π of the sky over a horizon at h all around', () => {
  const h = 24 * RAD
  const plane = { tilt_deg: 90, faces_deg: 120 }
  const open = planeIrradiance(climate, sun, plane, GROUND, [])
  const closed = planeIrradiance(climate, sun, plane, GROUND, Array<number>(36).fill(24))
  expect(sum(closed.sky_Wm2) / sum(open.sky_Wm2)).toBeCloseTo(1 - (2 * h + Math.sin(2 * h)) / Math.PI, 3)
})

test('a leaning plane over a horizon keeps the share of the sky that a fine grid of rays finds', () => {
  const plane = { tilt_deg: 50, faces_deg: 160 }
  const horizon = [0, 12, 30, 45, 20, 5, 8, 15]
  const seenOf = (edgeAt: (azimuth: number) => number) => {
    let seen = 0
    for (let azimuth = 0.5; azimuth < 360; azimuth++)
      for (let altitude = 0.25; altitude < 90; altitude += 0.5)
        if (altitude >= edgeAt(azimuth))
          seen += Math.max(0, incidenceCosine(altitude, azimuth, 50, 160)) * Math.cos(altitude * RAD)
    return seen
  }
  const open = planeIrradiance(climate, sun, plane, GROUND, [])
  const closed = planeIrradiance(climate, sun, plane, GROUND, horizon)
  const expected = seenOf((azimuth) => horizonAt(horizon, azimuth)) / seenOf(() => 0)
  expect(sum(closed.sky_Wm2) / sum(open.sky_Wm2)).toBeCloseTo(expected, 2)
})
