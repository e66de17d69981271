import type { Substance } from '#engine/conduction/specs.ts'
import { gridLines } from '#engine/conduction/mesh-lines.ts'
import { check, type Check, type CheckGroup } from './check.ts'
import { rectangle, steady } from './parts/rectangle.ts'

const substance = (name: string, conductivity_WmK: number): Substance => ({
  name,
  conductivity_WmK,
  volumetricHeat_Jm3K: 1e6,
})
const concrete = substance('concrete', 1.15)
const wood = substance('wood', 0.12)
const insulation = substance('insulation', 0.029)
const aluminium = substance('aluminium', 230)

const MM = 0.001
const SOURCE = 'ISO 10211:2017, annex C, case 2'

/** Two-dimensional heat bridges through the assembly of the ground sections. */
export const bridgesChecks: CheckGroup = { topic: 'Heat bridge of ISO 10211', run: caseTwo }

/**
 * 500 mm wide, 47.5 mm high: concrete above, an aluminium web and flange under wood at the left end,
 * insulation elsewhere, an aluminium sheet below. Outside (above) 0 °C, inside (below) 20 °C.
 */
function caseTwo(): Check[] {
  const near = (places: readonly number[], least: number) => (at: number) =>
    least + 0.3 * Math.min(...places.map((place) => Math.abs(at - place)))
  const across = [0, 1.5, 15, 500].map((x) => x * MM)
  const up = [0, 1.5, 35, 36.5, 41.5, 47.5].map((z) => z * MM)
  const x = [...gridLines(across, near(across.slice(0, 3), 0.25 * MM), 1)]
  const z = [...gridLines(up, near(up, 0.25 * MM), 1)]
  const at = (px: number, pz: number): Substance => {
    const [left, height] = [px / MM, pz / MM]
    if (height > 41.5) return concrete
    if (height < 1.5) return aluminium
    if (left < 15 && height > 36.5) return wood
    if (left < 15 && height > 35) return aluminium
    if (left < 1.5) return aluminium
    return insulation
  }
  const whole = { from_m: 0, to_m: 500 * MM }
  const { system, nodeAt } = rectangle(x, z, at, [
    { side: 'top', ...whole, film_Wm2K: 1 / 0.06, temperature: 0 },
    { side: 'bottom', ...whole, film_Wm2K: 1 / 0.11, temperature: 20 },
  ])
  const { temperature, flow } = steady(system, [0, 20])
  const points: [string, number, number, number][] = [
    ['A', 0, 47.5, 7.1],
    ['B', 500, 47.5, 0.8],
    ['C', 0, 41.5, 7.9],
    ['D', 15, 41.5, 6.3],
    ['E', 500, 41.5, 0.8],
    ['F', 0, 36.5, 16.4],
    ['G', 15, 36.5, 16.3],
    ['H', 0, 1.5, 16.8],
    ['I', 500, 0, 18.3],
  ]
  return [
    ...points.map(([name, left, height, expected]) =>
      check({
        id: `THB-02/${name}`,
        title: `Aluminium through insulation: temperature at ${name}`,
        source: SOURCE,
        provenance: 'from memory',
        unit: '°C',
        expected,
        tolerance: 0.1,
        computed: temperature[nodeAt(left * MM, height * MM)],
      }),
    ),
    check({
      id: 'THB-02/flow',
      title: 'Aluminium through insulation: heat flow',
      source: SOURCE,
      provenance: 'from memory',
      unit: 'W/m',
      expected: 9.5,
      tolerance: 0.1,
      computed: flow[1],
    }),
  ]
}
