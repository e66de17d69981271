import { readdirSync, readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import type { Option } from '#contract/option.ts'
import { readOptionText } from '#contract/read-option.ts'
import { SOIL_STATES } from '#contract/soil.ts'
import { layersSystem } from '#engine/conduction/layers.ts'
import { sectionSystem } from '#engine/conduction/section.ts'
import { extremes } from '#engine/measures/extremes.ts'
import { simulateHouse } from '#engine/year/simulate-house.ts'
import { toHouse } from '#modelling/to-house.ts'
import { climateNames, loadClimate } from '../../server/climates/library.ts'
import { loadLibrary } from '../../server/libraries/library.ts'

const library = loadLibrary()
const folder = new URL('../../data/examples/', import.meta.url)
const houses = readdirSync(folder).filter((file) => file.endsWith('.json'))
const testCases = readdirSync(new URL('std140/', folder)).map((file) => `std140/${file}`)
const read = (file: string) => readOptionText(readFileSync(new URL(file, folder), 'utf8'), library)

const bermed = (option: Option) => option.sides.some(({ berm }) => berm)

test.each([...houses, ...testCases])('%s is an option that the engine takes in every soil state', (file) => {
  const option = read(file)
  for (const state of SOIL_STATES) {
    const done = new Set<string>()
    for (const { spec } of toHouse(option, library, state).elements) {
      const key = JSON.stringify(spec)
      if (done.has(key)) continue
      done.add(key)
      if (spec.kind === 'section') expect(sectionSystem(spec).mesh.substance.length).toBeGreaterThan(500)
      if (spec.kind === 'layers') expect(layersSystem(spec).capacity_JK.length).toBeGreaterThan(1)
    }
  }
})

test('houses stand on five or more sites; one has no berm, one is a bare cell, one has 6 m of umbrella', () => {
  const options = houses.map(read)
  const known = climateNames().map(({ id }) => id)
  for (const { climate } of options) expect(known).toContain(climate)
  expect(new Set(options.map(({ climate }) => climate)).size).toBeGreaterThanOrEqual(5)
  const onGround = options.filter(({ floor }) => floor.below.kind === 'ground')
  expect(onGround.some((option) => !bermed(option))).toBe(true)
  expect(options.some(({ floor, use }) => floor.below.kind !== 'ground' && use.people === 0)).toBe(true)
  expect(options.some(({ sides }) => sides.some(({ umbrella }) => umbrella && umbrella.reach_m >= 6))).toBe(
    true,
  )
})

test('the house of the southern hemisphere has most of its glass to the north', async () => {
  for (const option of houses.map(read)) {
    const { latitude_deg } = (await loadClimate(option.climate!)).place
    if (latitude_deg >= 0) continue
    const glass = (towards: number) =>
      option.sides
        .filter(({ faces_deg }) => faces_deg === towards)
        .flatMap(({ openings }) => openings)
        .reduce((sum, one) => sum + (one.kind === 'window' ? one.width_m * one.height_m : 0), 0)
    expect(glass(0)).toBeGreaterThan(4 * glass(180))
    return
  }
  throw new Error('no example stands in the southern hemisphere')
})

/** Coldest and warmest hour without a fire, in the soil that the example expects. */
async function lived(file: string, climate?: string) {
  const option = read(file)
  const model = { ...toHouse(option, library, option.soil?.guess ?? 'damp'), heating: null, cooling: null }
  const { repeating } = simulateHouse(model, await loadClimate(climate ?? option.climate!))
  return extremes(repeating.trace.operative_C, { below_C: [], above_C: [] }, { firstHour: 0, repeats: true })
}

test('in one climate the poor design is colder in winter and hotter in summer than the good one', async () => {
  const poor = await lived('glass-burrow.json', 'denver')
  const good = await lived('juniper-shelf.json', 'denver')
  expect(poor.coldest.temperature_C).toBeLessThan(good.coldest.temperature_C - 5)
  expect(poor.warmest.temperature_C).toBeGreaterThan(good.warmest.temperature_C + 5)
})
