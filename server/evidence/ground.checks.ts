import { gridLines } from '#engine/conduction/mesh-lines.ts'
import { sectionSystem } from '#engine/conduction/section.ts'
import type { SectionSpec } from '#engine/conduction/specs.ts'
import { check, type Check, type CheckGroup } from './check.ts'
import { BERMED_SECTION } from './parts/bermed-section.ts'
import { FIXED_WM2K, flowOfFixed, rectangle, steady, type Side } from './parts/rectangle.ts'

const unit = { name: 'ground', conductivity_WmK: 1, volumetricHeat_Jm3K: 1e6 }

/** Steady heat through two-dimensional ground. */
export const groundChecks: CheckGroup = {
  topic: 'Ground in two dimensions',
  run: () => [
    ...strip(),
    ...umbrella(10),
    ...umbrella(16),
    ...ring(),
    ...slabByDimension(),
    ...halving(),
    ...bounds(),
  ],
}

/** Ascending lines, finest at the given places. */
function lines(stops: readonly number[], fine: readonly number[], least_m: number, growth: number): number[] {
  return [
    ...gridLines(
      [...stops].sort((a, b) => a - b),
      (at) => least_m + growth * Math.min(...fine.map((place) => Math.abs(at - place))),
      1,
    ),
  ]
}

/**
 * Half of an endless strip of floor, 1 on the floor, falling to 0 in a straight line across the wall, 0 outside.
 *
 * @returns heat through half of the floor for conductivity 1 and 1 K
 */
function stripFlow(width_m: number, wall_m: number): number {
  const half = width_m / 2
  const far = 400
  const x = lines([0, half, half + wall_m, far], [half, half + wall_m], wall_m / 400, 0.12)
  const z = lines([-far, 0], [0], wall_m / 400, 0.12)
  const { system, nodeAt } = rectangle(x, z, () => unit, [])
  const given = x.map((at) => ({
    node: nodeAt(at, 0),
    temperature: Math.min(1, Math.max(0, 1 - (at - half) / wall_m)),
  }))
  const flow = flowOfFixed(system, given)
  // The node at the floor's edge stands for half a cell of wall as well; what enters there is left out.
  return x.reduce(
    (sum, at, i) => (at < half - 1e-9 ? sum + flow[i] : at < half + 1e-9 ? sum + flow[i] / 2 : sum),
    0,
  )
}

const stripFormula = (c: number, w: number) =>
  (2 / Math.PI) * ((c / w) * Math.log(1 + w / c) + Math.log(1 + c / w))

function strip(): Check[] {
  return [
    check({
      id: 'GND-08',
      title:
        'Endless strip of floor 12 m wide, wall of 0.24 m: heat through the floor over conductivity and difference',
      source: 'Exact: (2/π) [(c/W) ln(1 + W/c) + ln(1 + c/W)]; Delsante, Stokes and Walsh 1983',
      provenance: 'derived',
      unit: '-',
      expected: 3.13342,
      tolerance: 0.0313,
      computed: 2 * stripFlow(12, 0.24),
      note: '1 % of the flow.',
    }),
  ]
}

function umbrella(b: number): Check[] {
  const a = 4
  const [flow, t1, t3, t6, tip] =
    b === 10 ? [1.39026, 0.89528, 0.71019, 0.51594, 0.42776] : [1.13968, 0.91171, 0.7539, 0.58144, 0.39214]
  const far = 12 * b
  const middle = (a + b) / 2
  const x = lines([0, a, middle, b, far], [a, b], 0.002, 0.14)
  const z = lines([-far, -6, -3, -1, 0], [0], 0.002, 0.14)
  const sides: Side[] = [
    { side: 'top', from_m: 0, to_m: a, film_Wm2K: FIXED_WM2K, temperature: 1 },
    { side: 'top', from_m: b, to_m: far, film_Wm2K: FIXED_WM2K, temperature: 0 },
  ]
  const { system, nodeAt } = rectangle(x, z, () => unit, sides)
  const found = steady(system, [1, 0])
  const source = 'Exact by conformal map: Q = 2 K(k)/K(k′), k = a/b'
  const at = (id: string, x_m: number, depth_m: number, expected: number, where: string) =>
    check({
      id: `GND-10/${b}/${id}`,
      title: `Floor 8 m wide, insulated to ${b} m from its middle: temperature ${where}, floor 1, outside 0`,
      source,
      provenance: 'derived',
      unit: '-',
      expected,
      tolerance: 0.01,
      computed: found.temperature[nodeAt(x_m, -depth_m)],
    })
  return [
    check({
      id: `GND-10/${b}/flow`,
      title: `Floor 8 m wide, insulated to ${b} m from its middle: heat over conductivity and difference`,
      source,
      provenance: 'derived',
      unit: '-',
      expected: flow,
      tolerance: 0.01 * flow,
      computed: 2 * found.flow[0],
      note: '1 % of the flow.',
    }),
    at('1m', 0, 1, t1, '1 m below the middle'),
    at('3m', 0, 3, t3, '3 m below the middle'),
    at('6m', 0, 6, t6, '6 m below the middle'),
    at('under', middle, 0, tip, 'just under the umbrella, half way'),
  ]
}

function ring(): Check[] {
  return (
    [
      [4, 10, 3.4286],
      [4.57, 10.67, 3.7051],
    ] as const
  ).map(([a, b, expected]) => {
    const r = lines([a, b], [a], 0.1, 0.05)
    const turn = Array.from({ length: 25 }, (_, i) => (Math.PI * i) / 24)
    const sides: Side[] = [
      { side: 'left', from_m: 0, to_m: Math.PI, film_Wm2K: FIXED_WM2K, temperature: 1 },
      { side: 'right', from_m: 0, to_m: Math.PI, film_Wm2K: FIXED_WM2K, temperature: 0 },
    ]
    const { system } = rectangle(
      r,
      turn,
      () => unit,
      sides,
      (radius, angle) => [radius * Math.cos(angle), radius * Math.sin(angle)],
    )
    return check({
      id: `GND-11/${a}-${b}`,
      title: `Half ring of ground from ${a} to ${b} m on bent cells: heat over conductivity and difference`,
      source: 'Exact: π / ln(b/a)',
      provenance: 'derived',
      unit: '-',
      expected: b === 10 ? expected : Math.PI / Math.log(b / a),
      tolerance: 0.01 * expected,
      computed: steady(system, [1, 0]).flow[0],
      note: '1 % of the flow.',
    })
  })
}

function slabByDimension(): Check[] {
  const conductivity = 1.9
  const difference_K = 20
  // 12 m by 12 m: B' = A / (P/2) = 6 m, half of it inside each half-section, 48 m of them.
  const flow_W = stripFlow(6, 0.24) * conductivity * difference_K * 48
  const share = flow_W / 2432.6 - 1
  return [
    check({
      id: 'GND-09',
      title:
        'Case GC10a, slab of 12 by 12 m on deep ground: steady heat, through sections of the characteristic dimension',
      source: 'Delsante, Stokes and Walsh 1983; IEA SHC Task 34 / ECBCS Annex 43 (2008), case GC10a',
      provenance: 'derived',
      unit: 'W',
      expected: 2432.6,
      tolerance: 0.05 * 2432.6,
      computed: flow_W,
      note: `A two-dimensional section stands for the corners by the characteristic dimension of ISO 13370: ${(100 * share).toFixed(1)} % off the exact three-dimensional slab.`,
    }),
    check({
      id: 'GND-09/strip',
      title: 'The same strip of 6 m against its exact flow',
      source: 'Exact: as GND-08',
      provenance: 'derived',
      unit: '-',
      expected: stripFormula(6, 0.24) / 2,
      tolerance: 0.005 * stripFormula(6, 0.24),
      computed: stripFlow(6, 0.24),
      note: '1 % of the flow.',
    }),
  ]
}

/** Heat from the room into a section's floor and wall for 1 K between room and outdoors [W/(m K)]. */
function coupling(spec: SectionSpec): number {
  const { system } = sectionSystem(spec)
  const names = system.boundaries.map(({ name }) => name)
  const inputs: number[] = names.map((name) => (name === 'floor' || name === 'wall-inside' ? 1 : 0))
  const { flow } = steady(system, inputs)
  return flow.reduce((sum, value, g) => sum + value * inputs[g], 0)
}

function halving(): Check[] {
  const bermed = BERMED_SECTION
  const cases: [string, SectionSpec][] = [
    ['bermed with an umbrella', bermed],
    ['bermed without an umbrella', { ...bermed, umbrella: null }],
    [
      'on level ground',
      { ...bermed, umbrella: null, cover: null, berm: null, wallTop_m: bermed.floorLevel_m + 0.4 },
    ],
    [
      'dug in by 0.6 m',
      {
        ...bermed,
        umbrella: null,
        cover: null,
        berm: null,
        skirt: null,
        floorLevel_m: -0.6,
        footing: bermed.footing && { ...bermed.footing, depth_m: 1.2 },
        wallTop_m: 0.3,
      },
    ],
  ]
  return cases.map(([what, spec]) =>
    check({
      id: `MSH-01/${what.replaceAll(' ', '-')}`,
      title: `Section ${what}: steady ground heat with every cell halved, over that of the usual mesh`,
      source: 'Convergence of the mesh; limit of 1 % is the program’s own',
      provenance: 'derived',
      unit: '-',
      expected: 1,
      tolerance: 0.01,
      computed: coupling({ ...spec, refinement: 2 }) / coupling(spec),
    }),
  )
}

function bounds(): Check[] {
  const { system } = sectionSystem(BERMED_SECTION)
  const { temperature, flow } = steady(
    system,
    system.boundaries.map(({ name }) => (name === 'floor' || name === 'wall-inside' ? 1 : 0)),
  )
  const beyond = temperature.reduce((most, value) => Math.max(most, value - 1, -value), 0)
  return [
    check({
      id: 'MSH-02/bounds',
      title: 'Bermed section: steady temperatures beyond those of room (1) and outdoors (0)',
      source: 'Maximum principle of steady conduction',
      provenance: 'derived',
      unit: 'K',
      expected: 0,
      tolerance: 1e-6,
      computed: beyond,
    }),
    check({
      id: 'MSH-02/balance',
      title: 'Bermed section: sum of all steady flows over the flow from the room',
      source: 'Conservation of heat',
      provenance: 'derived',
      unit: '-',
      expected: 0,
      tolerance: 1e-9,
      computed: flow.reduce((sum, value) => sum + value, 0) / flow[0],
    }),
  ]
}
