import { Body, Observer, SearchAltitude } from 'astronomy-engine'
import { expect, test } from 'vitest'
import { HOURS, type ClimatePlace } from '#engine/climate/climate-year.ts'
import { incidenceCosine, sunAt, sunOfYear } from '#engine/solar/sun.ts'

const at = (latitude_deg: number, longitude_deg = 0, timeZone_h = 0): ClimatePlace => ({
  name: 'Point',
  latitude_deg,
  longitude_deg,
  elevation_m: 0,
  timeZone_h,
})
const sum = (values: Float64Array, from = 0, to = values.length) =>
  values.subarray(from, to).reduce((total, value) => total + value, 0)

test('the sunlit parts of hours add up to the days of an ephemeris of its own (astronomy-engine)', () => {
  const { sunlit } = sunOfYear(at(52, 13, 1))
  const observer = new Observer(52, 13, 0)
  let worst_min = 0
  for (let day = 0; day < 365; day += 7) {
    const midnight = new Date(Date.UTC(2014, 0, 1 + day) - 3_600_000)
    // Almanacs lift the sun on the horizon by 34'; its centre is seen there when it is so much below.
    const crossing = (direction: number) =>
      SearchAltitude(Body.Sun, observer, direction, midnight, 1, -34 / 60)!.date.getTime() / 60_000
    const length_min = crossing(-1) - crossing(1)
    worst_min = Math.max(worst_min, Math.abs(60 * sum(sunlit, day * 24, day * 24 + 24) - length_min))
  }
  // Formulas of refraction part by 0.09° on the horizon, which the sun of midwinter climbs in 0.7 minutes here.
  expect(worst_min).toBeLessThan(1.5)
})

test('the position of a sunrise hour is that of its sunlit part, not of its middle', () => {
  const place = at(40)
  const sun = sunOfYear(place)
  let seen = 0
  for (let hour = 0; hour < HOURS; hour++) {
    const lit = sun.sunlit[hour]
    if (lit === 0 || lit === 1) continue
    seen++
    const isMorning = hour % 24 < 12
    const middle_h = isMorning ? hour + 1 - lit / 2 : hour + lit / 2
    const expected = sunAt(place, middle_h)
    expect(Math.abs(sun.altitude_deg[hour] - expected.altitude_deg), `hour ${hour}`).toBeLessThan(0.1)
    expect(Math.abs(sun.azimuth_deg[hour] - expected.azimuth_deg), `hour ${hour}`).toBeLessThan(0.1)
    expect(sun.altitude_deg[hour]).toBeGreaterThan(0)
  }
  expect(seen).toBeGreaterThan(700)
})

test('beyond the polar circle there are days all dark and all light, and every value is a number', () => {
  for (const latitude of [70, -70, 90, -90]) {
    const sun = sunOfYear(at(latitude))
    for (const series of Object.values(sun) as Float64Array[])
      expect(series.every((value) => Number.isFinite(value))).toBe(true)
    const january = sum(sun.sunlit, 24 * 9, 24 * 10)
    const june = sum(sun.sunlit, 24 * 171, 24 * 172)
    expect([january, june]).toEqual(latitude > 0 ? [0, 24] : [24, 0])
  }
})

test('at noon the sun stands south of 40° north, north of 33° south, and east in the morning at both', () => {
  const [north, south] = [sunOfYear(at(40)), sunOfYear(at(-33))]
  for (let day = 0; day < 365; day++) {
    expect(Math.abs(north.azimuth_deg[day * 24 + 12] - 180)).toBeLessThan(35)
    const fromNorth = ((south.azimuth_deg[day * 24 + 12] + 180) % 360) - 180
    expect(Math.abs(fromNorth)).toBeLessThan(50)
    expect(north.azimuth_deg[day * 24 + 8]).toBeLessThan(180)
    expect(south.azimuth_deg[day * 24 + 8]).toBeLessThan(180)
  }
})

test('clock and longitude go together: 15 degrees further east with an hour’s earlier clock is nearly the same sun', () => {
  const [here, there] = [sunOfYear(at(45, 0, 0)), sunOfYear(at(45, 15, 1))]
  // The sun itself moves on by an hour of its yearly way: 0.017° of declination at most, 0.02° of hour angle.
  for (let hour = 0; hour < HOURS; hour++)
    if (!(Math.abs(here.altitude_deg[hour] - there.altitude_deg[hour]) < 0.05))
      if (here.sunlit[hour] === 1) expect.fail(`hour ${hour}`)
})

test('incidence: flat is the sine of altitude, upright facing the sun its cosine, from behind negative', () => {
  expect(incidenceCosine(30, 77, 0, 200)).toBeCloseTo(0.5, 12)
  expect(incidenceCosine(30, 77, 90, 77)).toBeCloseTo(Math.cos(Math.PI / 6), 12)
  expect(incidenceCosine(30, 77, 90, 257)).toBeCloseTo(-Math.cos(Math.PI / 6), 12)
  expect(incidenceCosine(30, 77, 60, 77)).toBeCloseTo(1, 12)
})
