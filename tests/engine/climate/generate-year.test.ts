import { expect, test } from 'vitest'
import type { ClimateYear } from '#engine/climate/climate-year.ts'
import { dailyHighest, dailyLowest, dailyMeans, dailyRanges } from '#engine/climate/day-values.ts'
import { generateYear } from '#engine/climate/generate-year.ts'
import { monthMeans } from '#engine/climate/month-curve.ts'
import { extraterrestrialNormal, sunHours } from '#engine/climate/solar-day.ts'
import { builtInPlaces } from '../../../server/climates/normals-file.ts'

const places = builtInPlaces()
const byId = (id: string) => {
  const place = places.find((candidate) => candidate.id === id)
  if (place === undefined) throw new Error(`no place ${id}`)
  return place
}
const months = (values: Float64Array): Float64Array => monthMeans(dailyMeans(values))
const series = ({ place: _place, source: _source, ...arrays }: ClimateYear): Float64Array[] =>
  Object.values(arrays)

test.each(places.map((place) => [place.id, place] as const))(
  '%s: the year has its monthly normals: temperature within 0.2 K, radiation within 2 %',
  (_, { normals }) => {
    for (const seed of [1, 12345]) {
      const year = generateYear(normals, seed)
      months(year.outdoor_C).forEach((value, m) =>
        expect(Math.abs(value - normals.mean_C[m])).toBeLessThan(0.2),
      )
      months(year.global_Wm2).forEach((value, m) => {
        const wanted = normals.global_kWhm2day[m]
        expect(Math.abs(value * 0.024 - wanted)).toBeLessThanOrEqual(0.02 * wanted)
      })
      months(year.wind_ms).forEach((value, m) => expect(value).toBeCloseTo(normals.wind_ms[m], 6))
      // hours at the dew point (fog) leave a little
      months(year.dewPoint_C).forEach((value, m) =>
        expect(Math.abs(value - normals.dewPoint_C[m])).toBeLessThan(0.3),
      )
      months(year.pressure_Pa).forEach((value, m) =>
        expect(Math.abs(value - normals.pressure_Pa[m])).toBeLessThan(100),
      )
      monthMeans(dailyRanges(year.outdoor_C)).forEach((value, m) =>
        // the two narrowest months of the coast, where weather alone moves more than the normal range
        expect(Math.abs(value - normals.highest_C[m] + normals.lowest_C[m])).toBeLessThan(1),
      )
      // the wave of Parton and Logan has one shape; normals whose mean lies elsewhere between the extremes shift them
      monthMeans(dailyHighest(year.outdoor_C)).forEach((value, m) =>
        expect(Math.abs(value - normals.highest_C[m])).toBeLessThan(1.6),
      )
      monthMeans(dailyLowest(year.outdoor_C)).forEach((value, m) =>
        expect(Math.abs(value - normals.lowest_C[m])).toBeLessThan(1.6),
      )
    }
  },
)

test.each(places.map((place) => [place.id, place] as const))(
  '%s: no hour is impossible: no sun at night, no beam beyond the solar constant, no dew point above the air',
  (_, { normals }) => {
    const year = generateYear(normals, 1)
    const sun = sunHours(normals.place)
    for (const values of series(year)) {
      expect(values.length).toBe(8760)
      expect(values.every(Number.isFinite)).toBe(true)
    }
    for (let i = 0; i < 8760; i++) {
      const { cosZenith } = sun
      const ok =
        (sun.outside_Wm2[i] > 0 || year.global_Wm2[i] === 0) &&
        year.global_Wm2[i] >= 0 &&
        year.global_Wm2[i] <= 0.97 * sun.outside_Wm2[i] &&
        year.beam_Wm2[i] <= extraterrestrialNormal(Math.floor(i / 24)) &&
        Math.abs(year.beam_Wm2[i] * cosZenith[i] + year.diffuse_Wm2[i] - year.global_Wm2[i]) < 1e-6 &&
        year.dewPoint_C[i] <= year.outdoor_C[i] &&
        year.sky_C[i] < year.outdoor_C[i] &&
        year.wind_ms[i] >= 0
      if (!ok) expect.fail(`hour ${i}`)
    }
  },
)

test('the same normals and seed give the same year to the last bit, another seed another one', () => {
  const { normals } = byId('taos')
  expect(series(generateYear(normals, 3))).toEqual(series(generateYear(normals, 3)))
  expect(generateYear(normals, 4).outdoor_C).not.toEqual(generateYear(normals, 3).outdoor_C)
})

test('polar night at Tromsø has no sun for weeks and summer nights have', () => {
  const { global_Wm2 } = generateYear(byId('tromso').normals, 1)
  expect(Math.max(...global_Wm2.slice(350 * 24, 360 * 24))).toBe(0)
  expect(global_Wm2[171 * 24 + 23]).toBeGreaterThan(0)
})

test('southern years are warm in January', () => {
  const year = months(generateYear(byId('christchurch').normals, 1).outdoor_C)
  expect(year[0]).toBeGreaterThan(year[6] + 8)
})

test('the source says that the year is generated, from what, and what is estimated', () => {
  const { source } = generateYear(byId('lhasa').normals, 1)
  expect(source).toMatch(/^Generated from monthly normals \(CLIMAT reports of WMO station 55591/)
  expect(source).toMatch(
    /estimated: hours and single days, beam share, sky temperature, monthly radiation .*wind/,
  )
})

test('throws RangeError naming the value that cannot be', () => {
  const { normals } = byId('taos')
  const bad = (change: object) => () => generateYear({ ...normals, ...change }, 1)
  expect(bad({ mean_C: normals.mean_C.map((value, m) => (m === 3 ? NaN : value)) })).toThrow(/mean_C\[3\]/)
  expect(bad({ wind_ms: [1, 2] })).toThrow(/wind_ms must have 12 values/)
  expect(bad({ global_kWhm2day: normals.global_kWhm2day.map((v) => v * 2) })).toThrow(RangeError)
  expect(
    bad({ global_kWhm2day: normals.global_kWhm2day.map((v) => v * 1.3), diffuse_kWhm2day: undefined }),
  ).toThrow(/clear sky lets through/)
  expect(bad({ highest_C: normals.lowest_C })).toThrow(/must lie between/)
  expect(bad({ place: { ...normals.place, latitude_deg: 91 } })).toThrow(/latitude_deg/)
})
