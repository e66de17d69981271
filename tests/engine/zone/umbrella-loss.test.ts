import { expect, test } from 'vitest'
import { repeatingYear } from '../../../server/engine/year/repeating-year.ts'
import { assemble } from '../../../server/engine/zone/assemble.ts'
import { allMonths, bermedHouse, weather, type SectionChoice } from './make-house.ts'

const held = {
  set_C: Array(24).fill(20),
  months: allMonths,
  power_W: 1e6,
  convectiveShare: 1,
  senses: 'air' as const,
}

/** Yearly heat that a room held at 20 °C loses through floor and wall of the bermed section [kWh]. */
function yearlyLoss_kWh(choice: SectionChoice): number {
  const model = bermedHouse(choice, { heating: held, cooling: held, windows: [] })
  const { trace } = repeatingYear(assemble(model, weather({ sun_Wm2: 0 })))
  return (
    trace.surfaces
      .filter((surface) => surface.element === 'section 0')
      .reduce((sum, surface) => sum + surface.flow_W.reduce((all, flow) => all + flow, 0), 0) / 1000
  )
}

test('with the room held at 20 °C a wider umbrella never makes the yearly ground loss larger', () => {
  const losses = [1, 3, 6].map((reach_m) => yearlyLoss_kWh({ reach_m }))
  expect(losses[1]).toBeLessThan(losses[0])
  expect(losses[2]).toBeLessThan(losses[1])
})

test('with the room held at 20 °C a thicker umbrella never makes the yearly ground loss larger', () => {
  const losses = [0.05, 0.1, 0.2].map((board_m) => yearlyLoss_kWh({ board_m }))
  expect(losses[1]).toBeLessThan(losses[0])
  expect(losses[2]).toBeLessThan(losses[1])
})
