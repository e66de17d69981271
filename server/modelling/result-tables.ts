import { MONTH_NAMES } from './dates.ts'
import type { OptionResult, RunResult, StateResult } from './option-result.ts'
import type { UnitTexts } from './units.ts'

/** Months of the expected soil state, and seasonal figures for all states, as lines of text. */
export function resultTables(result: OptionResult, units: UnitTexts): string[] {
  const own = result.states.find(({ state }) => state === result.guess) ?? result.states[0]
  return [...monthTable(result, own, units), '', ...seasonTable(result, units)]
}

function monthTable(result: OptionResult, own: StateResult, units: UnitTexts): string[] {
  const { free, lived } = own
  const t = units.temperatureNumber
  const head = ['', 'outdoors', 'mean', 'low', 'high', 'swing']
  const rows = MONTH_NAMES.map((name, m) => [
    name,
    t(free.measures.months.outdoor_C[m]),
    t(free.measures.months.operative_C[m]),
    t(free.operative.low_C[m]),
    t(free.operative.high_C[m]),
    units.differenceNumber(free.measures.swing.month_K[m]),
  ])
  if (result.hasHeating) {
    head.push('with fire', 'heating')
    rows.forEach((row, m) =>
      row.push(
        t(lived.measures.months.operative_C[m]),
        units.heatNumber(lived.measures.heating.month_kWh[m]),
      ),
    )
  }
  if (result.hasCooling) {
    head.push('cooling')
    rows.forEach((row, m) => row.push(units.heatNumber(lived.measures.cooling.month_kWh[m])))
  }
  const soil = result.hasGround ? `${own.state} soil, ` : ''
  const heat = result.hasHeating || result.hasCooling ? `; heat in ${units.heatUnit}` : ''
  const fire = result.hasHeating || result.hasCooling ? 'without a fire, ' : ''
  return [`Months (${soil}${fire}${units.temperatureUnit}${heat})`, ...table([head, ...rows])]
}

function seasonTable(result: OptionResult, units: UnitTexts): string[] {
  const { states } = result
  const t = units.temperatureNumber
  const degrees = units.temperatureUnit
  const fire = result.hasHeating || result.hasCooling ? ' without a fire' : ''
  const line = (name: string, value: (state: StateResult) => string) => [name, ...states.map(value)]
  const { low_C, high_C } = result.comfort
  const outside = (run: RunResult) => {
    const { below_h, above_h } = run.measures.comfort.fixed
    return `${below_h} / ${above_h}`
  }
  const rows = [
    line(`coldest hour${fire}, ${degrees}`, ({ free }) => t(free.measures.extremes.coldest.temperature_C)),
    line(`warmest hour${fire}, ${degrees}`, ({ free }) => t(free.measures.extremes.warmest.temperature_C)),
    line(`mean of the year${fire}, ${degrees}`, ({ free }) => t(free.measures.extremes.mean_C)),
    line(`hours below ${t(low_C)} / above ${t(high_C)}, ${degrees}`, ({ free }) => outside(free)),
  ]
  if (result.hasHeating)
    rows.push(
      line(`backup heat, ${units.heatUnit}`, ({ lived }) =>
        units.heatNumber(lived.measures.heating.year_kWh),
      ),
      line(`as firewood, ${units.woodUnit}`, ({ lived }) =>
        units.woodNumber(lived.measures.heating.firewood),
      ),
    )
  if (result.hasCooling)
    rows.push(
      line(`cooling, ${units.heatUnit}`, ({ lived }) => units.heatNumber(lived.measures.cooling.year_kWh)),
    )
  if (states.some(({ free }) => free.measures.carryOver))
    rows.push(
      line(`held over from autumn, ${units.heatUnit}`, ({ free }) =>
        units.heatNumber(free.measures.carryOver?.held_kWh ?? 0),
      ),
      line(`net of it back in the room, ${units.heatUnit}`, ({ free }) =>
        units.heatNumber(free.measures.carryOver?.returned_kWh ?? 0),
      ),
    )
  const head = [
    '',
    ...states.map(({ state }) =>
      !result.hasGround ? 'year' : state === result.guess ? `${state} (guess)` : state,
    ),
  ]
  return [result.hasGround ? 'The year by soil' : 'The year', ...table([head, ...rows])]
}

/** First column to the left, the others to the right. */
function table(rows: readonly (readonly string[])[]): string[] {
  const width = rows[0].map((_, k) => Math.max(...rows.map((row) => row[k].length)))
  return rows.map((row) =>
    `  ${row.map((cell, k) => (k === 0 ? cell.padEnd(width[0]) : cell.padStart(width[k] + 2))).join('')}`.trimEnd(),
  )
}
