import { reducedStepper } from '#engine/conduction/full-run.ts'
import { reductionError } from '#engine/conduction/reduction-error.ts'
import { reduce } from '#engine/conduction/reduce.ts'
import { sectionSystem } from '#engine/conduction/section.ts'
import type { ThermalSystem } from '#engine/conduction/thermal-system.ts'
import { check, type Check, type CheckGroup } from './check.ts'
import { BERMED_SECTION } from './parts/bermed-section.ts'
import { allNodes, chain, drive, modes } from './parts/drive-layers.ts'
import { exactHours } from './parts/exact-hours.ts'

/** What few modes cost against all nodes, and that heat is neither lost nor made. */
export const reductionChecks: CheckGroup = {
  topic: 'Modes against all nodes',
  run: () => [...matrixExponential(), ...wallInTime(), ...section()],
}

/** Outdoors a day on a slow wave; a room that follows more narrowly, in steps. Neither has a period of the shifts. */
const weather = (group: number, time_s: number) => {
  const hour = time_s / 3600
  return group === 0
    ? 8 - 9 * Math.cos((2 * Math.PI * hour) / 24) + 6 * Math.sin(hour / 61)
    : 19 + 2 * Math.sin((2 * Math.PI * (hour - 9)) / 24) + (Math.floor(hour / 100) % 2)
}

const largest = (a: Float64Array, b: Float64Array): number =>
  a.reduce((worst, value, i) => Math.max(worst, Math.abs(value - b[i])), a.length === b.length ? 0 : NaN)

const row = (
  id: string,
  title: string,
  source: string,
  unit: string,
  tolerance: number,
  computed: number,
  note?: string,
): Check =>
  check({
    id: `MODES/${id}`,
    title,
    source,
    provenance: 'derived',
    unit,
    expected: 0,
    tolerance,
    computed,
    note,
  })

const LAYERED = [
  { thickness_m: 0.02, conductivity_WmK: 0.8, volumetricHeat_Jm3K: 1.6e6 },
  { thickness_m: 0.08, conductivity_WmK: 0.04, volumetricHeat_Jm3K: 60000 },
  { thickness_m: 0.03, conductivity_WmK: 0.18, volumetricHeat_Jm3K: 1200 },
  { thickness_m: 0.2, conductivity_WmK: 0.7, volumetricHeat_Jm3K: 1.6e6 },
]

function matrixExponential(): Check[] {
  const source = 'mathjs 15, expm of the same nodes'
  const hours = 30 * 24
  const system = chain(LAYERED, { outside: 20, inside: 8 }, [0, 0.1])
  const exact = exactHours(system, hours, weather)
  const found = drive(modes(system), hours, 2, weather)
  const flow = (g: number) => largest(found.flow[g], exact.flow[g])
  return [
    row(
      'expm/inside',
      'Flow into the inner face of a layered wall, 30 days of hours: largest difference',
      source,
      'W/m²',
      1e-6,
      flow(1),
      'Tolerance: mathjs itself misses the steady flow of this wall by 5e-8 W/m², the modes by 2e-12.',
    ),
    row('expm/outside', 'Flow into its outer face: largest difference', source, 'W/m²', 1e-6, flow(0)),
    row(
      'expm/face',
      'Temperature of its inner face: largest difference',
      source,
      'K',
      1e-6,
      largest(found.probe[0], exact.probe[0]),
    ),
    row(
      'expm/within',
      'Temperature 100 mm deep: largest difference',
      source,
      'K',
      1e-6,
      largest(found.probe[1], exact.probe[1]),
    ),
  ]
}

function wallInTime(): Check[] {
  const hours = 60 * 24
  const thick = [{ thickness_m: 0.6, conductivity_WmK: 1.1, volumetricHeat_Jm3K: 2e6 }]
  const system = chain(thick, { outside: 25, inside: 8 }, [0, 0.3], { refinement: 3 })
  const few = reduce(system)
  const found = drive(reducedStepper(few), hours, 2, weather)
  const size = `${system.capacity_JK.length} nodes, ${few.modes} modes`
  const against = (id: string, name: string, full: ReturnType<typeof drive>) => [
    row(
      `${id}/face`,
      `0.6 m of rammed earth, 60 days from rest, ${size}: inner face, largest difference`,
      name,
      'K',
      0.005,
      largest(found.probe[0], full.probe[0]),
      'Tolerance: a tenth of what the whole house may differ (0.05 K).',
    ),
    row(
      `${id}/within`,
      `The same wall: its middle, largest difference`,
      name,
      'K',
      0.01,
      largest(found.probe[1], full.probe[1]),
    ),
  ]
  const closer = drive(modes(system, { tolerance: 1e-6 }), hours, 2, weather)
  const tr = drive(allNodes(system, { substeps: 60, scheme: 'tr-bdf2' }), hours, 2, weather)
  return [
    ...against(
      'crank-nicolson',
      'Crank-Nicolson, all nodes, steps of one minute',
      drive(allNodes(system, { substeps: 60 }), hours, 2, weather),
    ),
    ...against('tr-bdf2', 'TR-BDF2, all nodes, steps of one minute', tr),
    row(
      'closer',
      'Inner face with the tolerance of the reduction at 1e-6: largest difference',
      'TR-BDF2, all nodes, steps of one minute',
      'K',
      0.002,
      largest(closer.probe[0], tr.probe[0]),
    ),
    row(
      'books/wall',
      'Wall: hourly flows minus growth of the store, over the largest flow, worst hour of 60 days',
      'Conservation of energy',
      '1',
      1e-9,
      found.residual,
    ),
  ]
}

function section(): Check[] {
  const { system } = sectionSystem(BERMED_SECTION)
  const few = reduce(system)
  const errors = reductionError(system, few)
  const size = `bermed section, ${system.capacity_JK.length} nodes, ${few.modes} modes`
  const source = 'All nodes, steady sines: (K + iωC) T = B'
  const at = (hours: number) => errors.find(({ period_s }) => period_s === hours * 3600)
  const year = drive(reducedStepper(few), 8760, 0, (group, time_s) => weather(group < 2 ? 1 : 0, time_s))
  return [
    row(
      'section/year',
      `${size}: a year, largest error of a flow`,
      source,
      '%',
      1e-6,
      100 * (at(8760)?.flow ?? NaN),
      'The yearly sine lies in the span.',
    ),
    row(
      'section/season',
      `${size}: periods from 20 years to a month, largest error of a flow`,
      source,
      '%',
      0.5,
      100 * Math.max(...errors.filter(({ period_s }) => period_s > 2.5e6).map(({ flow }) => flow)),
      'Share of the flow that 1 K at its own face brings. Tolerance: yearly heat of the ground within 0.5 %.',
    ),
    row(
      'section/day',
      `${size}: a day, largest error of a face for 1 K`,
      source,
      'K',
      0.002,
      at(24)?.surface ?? NaN,
      'Tolerance: 0.02 K for a swing of 10 K either way.',
    ),
    row(
      'section/two-hours',
      `${size}: two hours, largest error of a face for 1 K`,
      source,
      'K',
      0.005,
      at(2)?.surface ?? NaN,
      'Tolerance: 0.01 K for the 2 K that weather or room swing in two hours.',
    ),
    row(
      'section/steady',
      `${size}: steady flows, largest error`,
      source,
      '%',
      1e-6,
      100 * steadyError(system, few),
    ),
    row(
      'section/books',
      `${size}: hourly flows minus growth of the store, over the largest flow, worst hour of a year`,
      'Conservation of energy',
      '1',
      1e-9,
      year.residual,
    ),
  ]
}

/** Steady flows by modes against a very slow sine on all nodes. */
function steadyError(system: ThermalSystem, few: ReturnType<typeof reduce>): number {
  return reductionError(system, few, [1e18])[0].flow
}
