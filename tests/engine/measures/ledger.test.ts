import fc from 'fast-check'
import { expect, test } from 'vitest'
import { ledger } from '#engine/measures/ledger.ts'
import { makeClosedTrace, makeTrace, series } from './make-trace.ts'

/** Flows that differ by name and change with hour and season. */
const flows = (seed: number) => (name: string) => {
  const k = [...name].reduce((sum, letter) => sum + letter.charCodeAt(0), seed)
  return (hour: number) =>
    400 * Math.sin(k + hour / (7 + (k % 5))) + 300 * Math.sin(k * 2 + hour / 1400) + 20 * Math.sin(hour * k)
}

test('what enters minus what leaves is what is stored, to 1e-9 of the throughput, whichever month the year begins in', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 364 }), fc.integer({ min: 1, max: 500 }), (firstDay, seed) => {
      const found = ledger(makeClosedTrace(firstDay * 24, flows(seed)))
      for (const book of [found.room, found.house, found.elements[0].ledger]) {
        expect(book.residualShare).toBeLessThan(1e-9)
        expect(book.throughput_kWh).toBeGreaterThan(100)
        expect(book.stored.length).toBeGreaterThan(0)
      }
    }),
    { numRuns: 8 },
  )
})

test('10 W that nobody booked show as 87.6 kWh of residual in room and house', () => {
  const whole = makeClosedTrace(0, flows(3))
  const found = ledger({ ...whole, solar_W: whole.solar_W.map((flow) => flow + 10) })
  expect(found.room.residual.year_kWh).toBeCloseTo(87.6, 6)
  expect(found.house.residual.year_kWh).toBeCloseTo(87.6, 6)
  expect(found.room.residual.month_kWh[1]).toBeCloseTo(0.01 * 28 * 24, 6)
  expect(found.room.residualShare).toBeGreaterThan(1e-3)
  expect(Math.abs(found.elements[0].ledger.residual.year_kWh)).toBeLessThan(1e-6)
})

test('errors of both signs do not cancel in the share', () => {
  const whole = makeClosedTrace(0, flows(3))
  const found = ledger({ ...whole, gains_W: whole.gains_W.map((flow, i) => flow + (i % 2 ? 50 : -50)) })
  expect(Math.abs(found.room.residual.year_kWh)).toBeLessThan(1e-6)
  expect(found.room.residualShare).toBeGreaterThan(0.01)
})

test('signs: 1 kW of sun for a year is 8,760 kWh in, cooling counts out, and months add up to the year', () => {
  const found = ledger(makeTrace({ solar_W: series(1000), cooling_W: series(250) }))
  const line = (kind: string) => found.room.flows.find((flow) => flow.kind === kind)!
  expect(line('sun').year_kWh).toBeCloseTo(8760, 6)
  expect(line('cooling').year_kWh).toBeCloseTo(-2190, 6)
  expect(line('sun').month_kWh[0]).toBeCloseTo(744, 6)
  expect(line('sun').month_kWh.reduce((a, b) => a + b)).toBeCloseTo(8760, 6)
})

test('a year without any flow has an empty ledger without residual', () => {
  const found = ledger(makeTrace())
  expect(found.room).toMatchObject({ throughput_kWh: 0, residualShare: 0 })
})
