import { beforeAll, expect, test } from 'vitest'
import type { OptionInput } from '#contract/option.ts'
import { readOption } from '#contract/read-option.ts'
import type { Option } from '#contract/option.ts'
import { answers } from '#modelling/answers.ts'
import { optionResult, type OptionResult } from '#modelling/option-result.ts'
import { resultTables } from '#modelling/result-tables.ts'
import { siUnits, usUnits } from '#modelling/units.ts'
import { loadClimate } from '../../server/climates/library.ts'
import { loadLibrary } from '../../server/libraries/library.ts'
import { plainOption } from '../contract/plain-option.ts'

const library = loadLibrary()
let option: Option
let result: OptionResult

beforeAll(async () => {
  const input: OptionInput = { ...plainOption(), heating: { set_C: 19, power_W: 5000 } }
  option = readOption(input, library)
  result = optionResult(option, library, await loadClimate('taos'), {
    charging: { month: 10, years: 1 },
  }).result
})

/** The same result with the figures of all states replaced, so that a sentence can be foretold. */
function withColdest(values_C: readonly number[]): OptionResult {
  const states = result.states.map((state, i) => {
    const { measures } = state.free
    const coldest = { month: 1, day: 20, hour: 6, temperature_C: values_C[i] }
    const extremes = { ...measures.extremes, coldest }
    return { ...state, free: { ...state.free, measures: { ...measures, extremes } } }
  })
  return { ...result, states }
}

test('the coldest night comes first, with the other soils where they read differently', () => {
  const first = (values: readonly number[]) => answers(withColdest(values), option, siUnits)[0].text
  expect(first([13.44, 12.9, 11.38])).toBe(
    'Without a fire the room falls to 12.9 °C on the coldest night (20 January), 13.4 °C if the soil is dry and 11.4 °C if it is wet.',
  )
  expect(first([12.9, 12.9, 12.9])).toBe(
    'Without a fire the room falls to 12.9 °C on the coldest night (20 January).',
  )
  expect(first([12, 12.9, 12])).toBe(
    'Without a fire the room falls to 12.9 °C on the coldest night (20 January), 12.0 °C if the soil is dry or wet.',
  )
})

test('all soil states are there, and a fire makes the room warmer than none', () => {
  expect(result.states.map(({ state }) => state)).toEqual(['dry', 'damp', 'wet'])
  for (const { free, lived } of result.states) {
    expect(lived.measures.extremes.mean_C).toBeGreaterThan(free.measures.extremes.mean_C)
    expect(free.measures.heating.year_kWh).toBe(0)
    expect(lived.measures.heating.year_kWh).toBeGreaterThan(0)
    expect(lived.charging).toHaveLength(1)
  }
})

test('a berm brings the caution that its pressure is for an engineer, a fire that it needs air', () => {
  const cautions = answers(result, option, siUnits).filter(({ kind }) => kind === 'caution')
  const text = cautions.map(({ text }) => text).join('\n')
  expect(text).toMatch(/Soil 1\.5 m high presses on its wall.*licensed engineer and the local code/)
  expect(text).toMatch(/combustion air of its own and a carbon monoxide alarm/)
  expect(text).toMatch(/radon/)
})

test('no sentence promises: the best, safety or a guarantee are not ours to give', () => {
  for (const { text } of answers(result, option, siUnits))
    expect(text).not.toMatch(/\b(optimal|best|safe|guarantee\w*|validated|certif\w*)\b/i)
})

test('no sentence and no table shows a figure that is not one, in either system of units', async () => {
  for (const units of [siUnits, await usUnits()]) {
    const texts = [...answers(result, option, units).map(({ text }) => text), ...resultTables(result, units)]
    for (const text of texts) expect(text).not.toMatch(/NaN|Infinity|undefined|null/)
    if (units.system === 'us') expect(texts.join('\n')).not.toMatch(/°C|kWh|\bkg\b|\d m\b/)
  }
})

test('the result survives JSON', () => {
  expect(JSON.parse(JSON.stringify(result))).toEqual(result)
})
