import { expect, test } from 'vitest'
import { carryOver } from '#engine/measures/carry-over.ts'
import { dryWood, makeElement, makeSurface, makeTrace, series, yearWave } from './make-trace.ts'

const settings = {
  length_m: { ground: 10 },
  shell: new Set<string>(['roof']),
  fuel: dryWood,
  stoveEfficiency: 0.65,
}
const KWH = 3.6e6
const sum = (values: number[]) => values.reduce((a, b) => a + b, 0)

/** Ground that stores a yearly cosine and gets all of it through the floor. */
function wavingGround(amplitude_kWh: number, peakDay: number) {
  const held = (hour: number) =>
    amplitude_kWh * KWH * Math.cos((2 * Math.PI * (hour + 1 - peakDay * 24)) / 8760)
  const stored_J = series(held)
  const flow_W = series((hour) => (held(hour) - held(hour - 1)) / 3600)
  return { element: makeElement({ stored_J, startStored_J: held(-1) }), flow_W }
}

test('a store that waves by 600 kWh holds 1,200 kWh at its peak above its trough, and the floor put it in', () => {
  const { element, flow_W } = wavingGround(600, 258.5)
  const found = carryOver(makeTrace({ elements: [element], surfaces: [makeSurface({ flow_W })] }), settings)!
  expect(found.held_kWh).toBeCloseTo(1200, 0)
  expect(found.peak).toEqual({ month: 9, day: 16 })
  expect([3, 4]).toContain(found.trough.month)
  expect(found.putIn_kWh).toBeCloseTo(1200, 0)
  expect(found.cameBack_kWh).toBeCloseTo(1200, 0)
  expect(found.leaked_kWh).toBeCloseTo(0, 6)
  expect(found.kept_kWh).toBeCloseTo(0, 6)
  expect(found.faces[0].charging_kWh).toBeCloseTo(1200, 0)
  expect(found.faces[0].returning_kWh).toBeCloseTo(-1200, 0)
  expect(found.faces[0].putIn_kWh[11]).toBe(0) // December: it gives
  expect(found.faces[0].cameBack_kWh[11]).toBeGreaterThan(100)
  expect(Math.min(...found.day_kWh)).toBe(0)
})

test('what goes in by day and comes out by night is no carry-over', () => {
  const daily = series((hour) => (hour % 24 < 12 ? 500 : -500))
  const found = carryOver(makeTrace({ surfaces: [makeSurface({ flow_W: daily })] }), settings)!
  expect(found.putIn_kWh).toBeCloseTo(0, 9)
  expect(found.cameBack_kWh).toBeCloseTo(0, 9)
})

test('put in = came back + leaked + kept', () => {
  const { flow_W } = wavingGround(600, 250)
  const leak = series((hour) => -80 - 30 * Math.sin(hour / 900))
  const into = flow_W.map((flow) => flow + 100)
  let stored = 0
  const stored_J = series((hour) => (stored += 3600 * (into[hour] + leak[hour])))
  const found = carryOver(
    makeTrace({
      elements: [makeElement({ stored_J, outside_W: leak })],
      surfaces: [makeSurface({ flow_W: into })],
    }),
    settings,
  )!
  expect(found.leaked_kWh).toBeGreaterThan(600)
  expect(found.putIn_kWh - found.cameBack_kWh).toBeCloseTo(found.leaked_kWh + found.kept_kWh, 6)
  expect(found.charged_kWh - found.returned_kWh).toBeCloseTo(found.leaked_kWh + found.kept_kWh, 6)
  expect(found.returned_kWh).toBeLessThan(found.cameBack_kWh) // the room also feeds the leak in winter
})

test('heat probes of a section count per metre times its length, and stand in for the whole section', () => {
  const found = carryOver(
    makeTrace({
      elements: [makeElement({ stored_J: yearWave(0, 1e12, 250) })],
      probes: [
        { name: 'heat:store', element: 'ground', value: yearWave(0, 20 * KWH, 260) },
        { name: 'heat:wall', element: 'ground', value: yearWave(0, 5 * KWH, 220) },
        { name: 'berm 1 m', element: 'ground', value: yearWave(12, 500, 220) },
      ],
    }),
    settings,
  )!
  expect(found.stores.map(({ name }) => name)).toEqual(['ground: store', 'ground: wall'])
  expect(found.stores[0].own.swing_kWh).toBeCloseTo(2 * 20 * 10, 0)
  expect(sum(found.stores.map(({ held_kWh }) => held_kWh))).toBeCloseTo(found.held_kWh, 6)
  expect(found.held_kWh).toBeLessThan(2 * 25 * 10) // the parts peak on different days
  expect(() =>
    carryOver(makeTrace({ probes: [{ name: 'heat:store', element: 'ground', value: series(1) }] }), {
      ...settings,
      length_m: {},
    }),
  ).toThrow(/length of section "ground"/)
})

test('heat that a roof lets through in summer is shown but not counted as come back', () => {
  const { element, flow_W } = wavingGround(600, 258.5)
  const found = carryOver(
    makeTrace({
      elements: [
        element,
        makeElement({ name: 'roof', kind: 'layers', stored_J: yearWave(0, 50 * KWH, 200) }),
      ],
      surfaces: [
        makeSurface({ flow_W }),
        makeSurface({ name: 'ceiling', element: 'roof', part: 'ceiling', flow_W: series(-400) }),
      ],
    }),
    settings,
  )!
  expect(found.cameBack_kWh).toBeCloseTo(1200, 0)
  expect(found.held_kWh).toBeCloseTo(1200, 0)
  expect(found.faces.map(({ role }) => role)).toEqual(['ground', 'shell'])
  expect(found.faces[1].cameBack_kWh[0]).toBeCloseTo(0.4 * 744, 6)
})

test('a trough after the peak of the calendar year still splits the year into charging and returning', () => {
  const { element, flow_W } = wavingGround(600, 60) // southern hemisphere: peak 1 March, trough end of August
  const found = carryOver(makeTrace({ elements: [element], surfaces: [makeSurface({ flow_W })] }), settings)!
  expect(found.peak.month).toBe(3)
  expect(found.faces[0].charging_kWh).toBeCloseTo(1200, 0)
})

test('a ground that the room feeds all winter returned nothing, and no wood is credited for it', () => {
  const { element } = wavingGround(600, 258.5)
  const fed = makeSurface({ flow_W: series(200) })
  const found = carryOver(makeTrace({ elements: [element], surfaces: [fed] }), settings)!
  expect(found.returned_kWh).toBeLessThan(-500)
  expect(found.firewood.returned.mass_kg).toBe(0)
  expect(found.cameBack_kWh).toBe(0)
})

test('a house of thin shells alone has no carry-over', () => {
  const shell = [makeElement({ name: 'roof', kind: 'layers' })]
  expect(carryOver(makeTrace({ elements: shell, surfaces: [] }), settings)).toBeNull()
})
