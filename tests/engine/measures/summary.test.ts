import { expect, test } from 'vitest'
import { measureYear, type MeasureSettings } from '#engine/measures/summary.ts'
import { dryWood, makeClimate, makeElement, makeModel, makeSurface, makeTrace, series } from './make-trace.ts'

const settings: MeasureSettings = {
  model: makeModel(),
  people: 3,
  bedrooms: 2,
  vapour_kgh: new Array(24).fill(0.2),
  vapourBuffer: 1,
  comfort: { low_C: 18, high_C: 26 },
  limits: { below_C: [15, 18], above_C: [26] },
  fuel: dryWood,
  stoveEfficiency: 0.65,
  repeats: true,
}

const trace = makeTrace({
  heating_W: series((hour) => (hour < 2000 ? 500 : 0)),
  surfaces: [
    makeSurface(),
    makeSurface({ name: 'ceiling', element: 'roof', part: 'ceiling' }),
    makeSurface({ name: 'partition', element: 'partition', part: 'mass' }),
  ],
  elements: [
    makeElement(),
    makeElement({ name: 'roof', kind: 'layers' }),
    makeElement({ name: 'partition', kind: 'layers' }),
  ],
})

/** Paths of values that JSON would change: typed arrays, NaN, infinities, undefined. */
function notPlain(value: unknown, path = 'measures'): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [path]
  if (value === null || typeof value === 'string' || typeof value === 'boolean') return []
  if (Array.isArray(value)) return value.flatMap((entry, i) => notPlain(entry, `${path}[${i}]`))
  if (typeof value === 'object' && Object.getPrototypeOf(value) === Object.prototype)
    return Object.entries(value!).flatMap(([key, entry]) => notPlain(entry, `${path}.${key}`))
  return [path]
}

test('all measures of a year come in one call, as plain data that survives JSON unchanged', () => {
  const found = measureYear(trace, makeClimate(), settings)
  expect(notPlain(found)).toEqual([])
  expect(JSON.parse(JSON.stringify(found))).toEqual(found)
  expect(found.heating.year_kWh).toBeCloseTo(1000, 9)
})

test('the roof is shell, ground and partition are store', () => {
  const found = measureYear(trace, makeClimate(), settings)
  expect(found.carryOver!.faces.map(({ role }) => role)).toEqual(['ground', 'shell', 'mass'])
})

test('measuring leaves trace and climate as they were and gives the same answer twice', () => {
  const climate = makeClimate()
  const before = [trace.air_C, trace.surfaces[0].temperature_C, climate.outdoor_C].map((values) =>
    values.slice(),
  )
  const first = measureYear(trace, climate, settings)
  expect(measureYear(trace, climate, settings)).toEqual(first)
  expect([trace.air_C, trace.surfaces[0].temperature_C, climate.outdoor_C]).toEqual(before)
})

test('throws RangeError naming vapour_kgh when it has not 24 values', () => {
  expect(() => measureYear(trace, makeClimate(), { ...settings, vapour_kgh: [1] })).toThrow(/vapour_kgh/)
})
