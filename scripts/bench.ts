import { execFile } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import { parseArgs, promisify } from 'node:util'
import { HOURS } from '../server/engine/climate/climate-year.ts'
import { benchFull } from './bench/full-comparison.ts'
import { benchHouse, withGlass } from './bench/house.ts'
import { measureMemory } from './bench/memory.ts'
import { median, multiplyAdds, once, timeDot } from './bench/timing.ts'
import { chargingYears } from '../server/engine/year/charging.ts'
import { repeatingYear } from '../server/engine/year/repeating-year.ts'
import { assemble } from '../server/engine/zone/assemble.ts'
import { cachedElement, type ElementCache } from '../server/engine/zone/element-cache.ts'
import { liveYear } from '../server/engine/zone/live-year.ts'

const usage = `npm run -s bench -- [--json] [--runs N]
Speed and memory on a house with four sides, two of them bermed: medians, one process, one core.
--runs N: how many runs in a row the memory is watched over (1000).`

const { values } = parseArgs({
  options: {
    json: { type: 'boolean' },
    runs: { type: 'string', default: '1000' },
    memory: { type: 'boolean' },
    help: { type: 'boolean' },
  },
})
if (values.help) {
  console.log(usage)
  process.exit(0)
}
if (values.memory) {
  // In a process of its own, so that nothing else counts.
  console.log(JSON.stringify(await measureMemory(Number(values.runs))))
  process.exit(0)
}
const say = (text: string) => process.stderr.write(`${text}\n`)

const { model, climate, sun } = await benchHouse()
const sections = model.elements.filter(({ spec }) => spec.kind === 'section')
const cache: ElementCache = new Map()

// Memory is watched in a process of its own, on the other core; all that is compared below is timed here.
const watched = promisify(execFile)(process.execPath, [
  '--expose-gc',
  '--import',
  'tsx',
  fileURLToPath(import.meta.url),
  '--memory',
  '--runs',
  values.runs,
]).then(({ stdout }) => JSON.parse(stdout) as Awaited<ReturnType<typeof measureMemory>>)

say('Setting up sections …')
const setUp = (refinement: number) => {
  const spec = { ...sections[0].spec, refinement } as (typeof sections)[0]['spec']
  const fresh: ElementCache = new Map()
  const ms = median(3, () => once(() => cachedElement(spec, 'section', (fresh.clear(), fresh))))
  const made = cachedElement(spec, 'section', fresh)
  return { ms, cells: made.mesh!.substance.length, modes: made.reduced.modes }
}
const usual = setUp(1)
const fine = setUp(2)

say('Living years …')
const house = assemble(model, climate, cache, sun)
const cells = sections.map(({ spec, name }) => cachedElement(spec, name, cache).mesh!.substance.length)
const repeatingMs = median(5, () => once(() => repeatingYear(house)))
const changedMs = median(5, (i) =>
  once(() => repeatingYear(assemble(withGlass(model, 1 + 0.02 * (i + 1)), climate, cache, sun))),
)
const variantsMs = once(() => {
  for (let i = 0; i < 100; i++)
    repeatingYear(assemble(withGlass(model, 0.7 + 0.006 * i), climate, cache, sun))
})
const chargingMs = (years: number) =>
  median(3, () => once(() => chargingYears(house, cache, { month: 10, years })))
const charging5 = chargingMs(5)
const charging10 = chargingMs(10)

say('Comparing the hour loop with a dot product …')
const loopMs = median(9, () => once(() => liveYear(house, 0, null, null)))
const dotMs = median(9, () => timeDot(multiplyAdds(house) * HOURS))

say('Comparing reduced with full …')
const full = benchFull(model, climate, sun, loopMs)

say(`Waiting for ${values.runs} runs in a row in a second process …`)
const memory = await watched

/** How a time grows when a size doubles, from two sizes. */
const perDoubling = (small: { size: number; ms: number }, large: { size: number; ms: number }) =>
  (large.ms / small.ms) ** (1 / Math.log2(large.size / small.size))

const result = {
  house: { sides: sections.length, cells_per_section: cells, modes_per_section: usual.modes },
  reduced_against_full: full,
  hour_cost_over_limit: loopMs / dotMs,
  hour_loop: { year_ms: loopMs, multiply_adds_per_hour: multiplyAdds(house), dot_product_ms: dotMs },
  times_ms: {
    section_set_up: usual.ms,
    repeating_year: repeatingMs,
    repeating_year_windows_changed: changedMs,
    five_charging_years: charging5,
    hundred_variants: variantsMs,
  },
  growth: {
    section_set_up_when_cells_double: perDoubling(
      { size: usual.cells, ms: usual.ms },
      { size: fine.cells, ms: fine.ms },
    ),
    charging_when_years_double: charging10 / charging5,
    cells: [usual.cells, fine.cells],
  },
  memory,
}

if (values.json) console.log(JSON.stringify(result, null, 2))
else print(result)

function print(value: object, indent = ''): void {
  for (const [key, item] of Object.entries(value)) {
    const name = key.replaceAll('_', ' ')
    if (Array.isArray(item) || typeof item !== 'object') {
      const text = typeof item === 'number' ? Number(item.toPrecision(4)) : item
      console.log(`${indent}${name}: ${Array.isArray(text) ? text.join(', ') : text}`)
    } else {
      console.log(`${indent}${name}`)
      print(item as object, `${indent}  `)
    }
  }
}
