import { expect, test } from 'vitest'
import { beamOf, erbsDiffuseShare, maxwellBeam, splitByErbs, splitByMaxwell } from '#engine/climate/beam.ts'
import { bendtExponent, bendtQuantiles, clearnessRange, herzogExponent } from '#engine/climate/clearness.ts'
import { hourShare } from '#engine/climate/day-profile.ts'
import { dewPointFromHumidity, magnusPressure, standardPressure } from '#engine/climate/humidity.ts'
import { MONTH_DAYS } from '#engine/climate/calendar.ts'
import { monthCurve, monthMeans, noonPoints } from '#engine/climate/month-curve.ts'
import { normalQuantile, seeded } from '#engine/climate/seeded.ts'
import { clearSkyEmissivity, cloudFromClearness, hourlyCloud, skyTemperature } from '#engine/climate/sky.ts'
import {
  declination,
  sinElevation,
  SOLAR_CONSTANT_WM2,
  sunHours,
  sunsetAngle,
} from '#engine/climate/solar-day.ts'

const place = (latitude_deg: number, longitude_deg = 0, timeZone_h = 0) => ({
  name: 'test',
  latitude_deg,
  longitude_deg,
  elevation_m: 0,
  timeZone_h,
})

test('declination: 23.45 degrees at the June solstice, within 0.5 of Cooper 1969 on every day', () => {
  for (let day = 0; day < 365; day++) {
    const cooper = 23.45 * Math.sin((2 * Math.PI * (285 + day)) / 365)
    // Cooper's single sine is up to 1.6 degrees off Spencer at the equinoxes
    expect(Math.abs((declination(day) * 180) / Math.PI - cooper)).toBeLessThan(1.7)
  }
  expect((declination(171) * 180) / Math.PI).toBeCloseTo(23.45, 1)
})

test('day of no sun and day without night beyond the polar circle', () => {
  expect(sunsetAngle(70, declination(354))).toBe(0)
  expect(sunsetAngle(70, declination(171))).toBe(Math.PI)
  expect(sunsetAngle(0, declination(171))).toBeCloseTo(Math.PI / 2, 9)
})

test.each([
  [36.45, -105.667, -7],
  [27.7, 85.36, 5.75],
  [-23.8, 133.89, 9.5],
  [69.65, 18.94, 1],
  [-42.83, 147.5, 10],
  [65, 170, -9],
])(
  'hours add up to the daily integral at %d degrees, in every time zone (closed form of H0)',
  (lat, lon, tz) => {
    const sun = sunHours(place(lat, lon, tz))
    let hours = 0
    let days = 0
    for (let i = 0; i < 8760; i++) hours += sun.outside_Wm2[i]
    const phi = (lat * Math.PI) / 180
    for (let day = 0; day < 365; day++) {
      const delta = declination(day)
      const ws = sunsetAngle(lat, delta)
      const B = (2 * Math.PI * day) / 365
      const normal =
        SOLAR_CONSTANT_WM2 *
        (1.00011 +
          0.034221 * Math.cos(B) +
          0.00128 * Math.sin(B) +
          0.000719 * Math.cos(2 * B) +
          0.000077 * Math.sin(2 * B))
      days +=
        (24 / Math.PI) *
        normal *
        (Math.cos(phi) * Math.cos(delta) * Math.sin(ws) + ws * Math.sin(phi) * Math.sin(delta))
    }
    expect(hours / days).toBeCloseTo(1, 3)
  },
)

test('the middle of a sunlit hour has the elevation that the hour integral says, to 1 %', () => {
  const here = place(40, -105, -7)
  const sun = sunHours(here)
  for (const i of [12, 172 * 24 + 9, 300 * 24 + 14]) {
    expect(sun.cosZenith[i] / sinElevation(here, i + 0.5)).toBeCloseTo(1, 1.7)
  }
})

test('Erbs 1982 is continuous to 0.001 at its joints and never outside 0 to 1', () => {
  for (let kt = 0; kt <= 1; kt += 0.001) {
    const share = erbsDiffuseShare(kt)
    expect(share).toBeGreaterThan(0.16)
    expect(share).toBeLessThanOrEqual(1)
    expect(Math.abs(erbsDiffuseShare(kt + 1e-9) - share)).toBeLessThan(1e-3)
  }
})

test('a split hour closes: diffuse + beam × cosine of the zenith = global', () => {
  const sun = { outside_Wm2: 900, cosZenith: 0.7, sunlit: 0.9 }
  for (const split of [splitByErbs, splitByMaxwell]) {
    for (const global_Wm2 of [0, 50, 300, 700]) {
      const { beam_Wm2, diffuse_Wm2 } = split(global_Wm2, sun)
      expect(diffuse_Wm2 + beam_Wm2 * sun.cosZenith).toBeCloseTo(global_Wm2, 9)
      expect(beam_Wm2).toBeGreaterThanOrEqual(0)
    }
    expect(split(30, { ...sun, cosZenith: 0.01 })).toEqual({ beam_Wm2: 0, diffuse_Wm2: 30 })
  }
  expect(beamOf(100, { ...sun, cosZenith: 0.5 })).toBe(200)
})

test('Maxwell 1987: clear noon gives 850 to 1,000 W/m², overcast nothing, at air mass 1.15', () => {
  // kt 0.78 of 1,361 W/m²: the clear-day limit Knc = 0.866 - 0.122 × 1.15 + ... is 0.741 before the loss term
  const beam = maxwellBeam(0.78, 1 / 1.15, 1361)
  expect(beam).toBeGreaterThan(850)
  expect(beam).toBeLessThan(0.741 * 1361)
  expect(maxwellBeam(0.1, 0.8, 1361)).toBeLessThan(5)
  expect(maxwellBeam(0.5, 0.03, 1361)).toBe(0)
})

test('hourly shares of Collares-Pereira and Rabl 1979 add up to the day within 1 %', () => {
  for (const sunset of [1.1, Math.PI / 2, 2]) {
    let sum = 0
    for (let hour = 0; hour < 24; hour++) sum += hourShare(((hour - 11.5) * Math.PI) / 12, sunset)
    expect(Math.abs(sum - 1)).toBeLessThan(0.012)
  }
  expect(hourShare(Math.PI, Math.PI / 2)).toBe(0)
  expect(hourShare(0, 0)).toBe(0)
})

test.each([0.3, 0.4, 0.5, 0.6, 0.7])(
  'clearness of days has the monthly mean %d within 0.2 % (Bendt 1981)',
  (mean) => {
    const days = bendtQuantiles(mean, 31)
    const reached = days.reduce((sum, value) => sum + value, 0) / 31
    expect(Math.abs(reached / mean - 1)).toBeLessThan(0.002)
    for (let i = 1; i < 31; i++) expect(days[i]).toBeGreaterThan(days[i - 1])
    const range = clearnessRange(mean)
    expect(days[0]).toBeGreaterThan(range.low)
    expect(days[30]).toBeLessThan(range.high)
    // Herzog 1985 is a fit, good to some per cent of the exponents' span
    expect(Math.abs(bendtExponent(mean, range) - herzogExponent(mean, range))).toBeLessThan(0.16)
  },
)

test('a clearness outside its range is refused', () => {
  expect(() => bendtExponent(0.9, { low: 0.05, high: 0.8 })).toThrow(RangeError)
})

test('saturation pressure 2,339 Pa at 20 °C (steam table) and dew point 9.3 °C at 20 °C and 50 %', () => {
  expect(Math.abs(magnusPressure(20) - 2339)).toBeLessThan(8)
  expect(dewPointFromHumidity(20, 50)).toBeCloseTo(9.27, 1)
  expect(dewPointFromHumidity(12, 100)).toBeCloseTo(12, 9)
})

test('standard atmosphere: 89,875 Pa at 1,000 m and 79,495 Pa at 2,000 m (ICAO table)', () => {
  expect(Math.abs(standardPressure(1000) - 89875)).toBeLessThan(10)
  expect(Math.abs(standardPressure(2000) - 79495)).toBeLessThan(10)
})

test('clear sky of Berdahl and Martin 1984: 0.711 + 0.056 + 0.0073 at a dew point of 10 °C', () => {
  expect(clearSkyEmissivity(10, 6, 100000)).toBeCloseTo(0.7743, 9)
  expect(clearSkyEmissivity(10, 0, 90000)).toBeCloseTo(0.7743 + 0.013 - 0.012, 9)
})

test('cloud warms the sky towards the air and never beyond it', () => {
  expect(skyTemperature(10, 0.75, 0)).toBeCloseTo(283.15 * 0.75 ** 0.25 - 273.15, 9)
  expect(skyTemperature(10, 0.75, 1)).toBeGreaterThan(skyTemperature(10, 0.75, 0.5))
  expect(skyTemperature(10, 0.75, 1)).toBeLessThan(10)
  expect(cloudFromClearness(0.8)).toBe(0)
  expect(cloudFromClearness(0.1)).toBe(1)
})

test('days of polar night take their cloud from the days around', () => {
  const sun = sunHours(place(75))
  const cloud = hourlyCloud(
    sun.outside_Wm2.map((value) => value * 0.475),
    sun.outside_Wm2,
  )
  for (const value of cloud) expect(value).toBeCloseTo(0.5, 6)
  expect(hourlyCloud(new Float64Array(8760), new Float64Array(8760))[0]).toBe(0.6)
})

test('a month curve has the monthly means to 1e-6 and no jump of more than a tenth of the yearly range', () => {
  const means = [-4, -2, 3, 9, 15, 20, 23, 22, 17, 10, 3, -2]
  const daily = monthCurve(means)
  monthMeans(daily).forEach((value, month) => expect(value).toBeCloseTo(means[month], 6))
  for (let day = 0; day < 365; day++) {
    expect(Math.abs(daily[(day + 1) % 365] - daily[day])).toBeLessThan(0.6)
  }
  expect(MONTH_DAYS.reduce((sum, days) => sum + days, 0)).toBe(365)
})

test('noon points give back the daily means that they were made for', () => {
  const random = seeded(5)
  const means = Float64Array.from({ length: 365 }, () => random.normal())
  const points = noonPoints(means)
  for (let day = 0; day < 365; day++) {
    const reached = 0.75 * points[day] + 0.125 * (points[(day + 364) % 365] + points[(day + 1) % 365])
    expect(reached).toBeCloseTo(means[day], 6)
  }
})

test('the seeded generator repeats itself, differs by seed, and is uniform and normal', () => {
  const a = seeded(7)
  const b = seeded(7)
  const c = seeded(8)
  const first = Array.from({ length: 20000 }, () => a.uniform())
  expect(Array.from({ length: 20000 }, () => b.uniform())).toEqual(first)
  expect(c.uniform()).not.toBe(first[0])
  // 4 standard errors of 20,000 draws
  expect(Math.abs(first.reduce((s, v) => s + v, 0) / 20000 - 0.5)).toBeLessThan(0.0082)
  const normal = Array.from({ length: 20000 }, () => a.normal())
  expect(Math.abs(normal.reduce((s, v) => s + v, 0) / 20000)).toBeLessThan(0.028)
  expect(Math.abs(normal.reduce((s, v) => s + v * v, 0) / 20000 - 1)).toBeLessThan(0.04)
  expect(() => seeded(1.5)).toThrow(RangeError)
})

test('normal quantiles: 1.95996 at 97.5 % and 0 at a half, to 4.5e-4 (Abramowitz and Stegun 26.2.23)', () => {
  expect(Math.abs(normalQuantile(0.975) - 1.959964)).toBeLessThan(4.5e-4)
  expect(Math.abs(normalQuantile(0.001) + 3.090232)).toBeLessThan(4.5e-4)
  expect(Math.abs(normalQuantile(0.5))).toBeLessThan(4.5e-4)
})
