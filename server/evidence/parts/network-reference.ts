import { expm, lusolve, matrix, multiply, type MathNumericType } from 'mathjs'
import type { ThermalSystem } from '#engine/conduction/thermal-system.ts'

type Rows = number[][]

/** One wall of a small room as a plain network: its nodes, an outdoor and an indoor film. */
export interface WallChain {
  readonly system: ThermalSystem
  readonly area_m2: number
  /** Convective and radiative part of the inner film [W/(m² K)]. */
  readonly convective_Wm2K: number
  readonly radiative_Wm2K: number
  /** Share of the radiant gains that falls on it. */
  readonly radiantShare: number
}

export interface SmallRoom {
  readonly walls: readonly WallChain[]
  readonly airCapacity_JK: number
  /** Air to outdoors [W/K]. */
  readonly loss_WK: number
  readonly convectiveGain_W: number
  readonly radiantGain_W: number
  readonly start_C: number
}

export interface RoomHours {
  /** Mean of each hour [°C]. */
  readonly air_C: Float64Array
  readonly radiant_C: Float64Array
}

const HOUR_S = 3600

/**
 * The room with temperatures that are constant within each hour, as the program has it, by the matrix
 * exponential of each wall and a linear solve for air, radiant node and all faces. Written from the
 * equations, with general-purpose matrix routines only: no modes, no reduction, no response factors.
 *
 * @param outdoor_C at the end of each hour; `before_C` at the start of the first
 */
export function hourMeanRoom(room: SmallRoom, outdoor_C: Float64Array, before_C: number): RoomHours {
  const walls = room.walls.map((wall) => ({ ...wall, ...wallStep(wall) }))
  const states = walls.map(({ nodes }) => new Array<number>(nodes).fill(room.start_C))
  const air_C = new Float64Array(outdoor_C.length)
  const radiant_C = new Float64Array(outdoor_C.length)
  const capacity_WK = room.airCapacity_JK / HOUR_S
  let air = room.start_C
  let outdoorBefore = before_C
  for (let hour = 0; hour < outdoor_C.length; hour++) {
    const outdoor = outdoor_C[hour]
    // Unknowns: air, radiant, then for each wall its face and its indoor equivalent temperature.
    const size = 2 + 2 * walls.length
    const left: Rows = Array.from({ length: size }, () => new Array<number>(size).fill(0))
    const right = new Array<number>(size).fill(0)
    left[0][0] = capacity_WK + room.loss_WK
    right[0] = capacity_WK * air + room.loss_WK * 0.5 * (outdoorBefore + outdoor) + room.convectiveGain_W
    walls.forEach((wall, w) => {
      const face = 2 + 2 * w
      const input = face + 1
      const convective_WK = wall.convective_Wm2K * wall.area_m2
      const radiative_WK = wall.radiative_Wm2K * wall.area_m2
      const film_WK = convective_WK + radiative_WK
      const gain_W = room.radiantGain_W * wall.radiantShare
      left[0][0] += convective_WK
      left[0][face] -= convective_WK
      left[1][1] += radiative_WK
      left[1][face] -= radiative_WK
      // film · input = convective · air + radiative · radiant + gain
      left[input][input] = film_WK
      left[input][0] = -convective_WK
      left[input][1] = -radiative_WK
      right[input] = gain_W
      // The face lies between the input and the wall: film (input - face) = what the wall takes on average.
      const known = wall.meanFlow([...states[w], outdoorBefore, outdoor, 0])
      const perKelvin = wall.meanFlow([...new Array<number>(wall.nodes + 2).fill(0), 1])
      left[face][input] = film_WK - perKelvin * wall.area_m2
      left[face][face] = -film_WK
      right[face] = known * wall.area_m2
    })
    const solved = (lusolve(left, right) as number[][]).map((row) => row[0])
    walls.forEach((wall, w) => {
      states[w] = wall.next([...states[w], outdoorBefore, outdoor, solved[3 + 2 * w]])
    })
    air = air_C[hour] = solved[0]
    radiant_C[hour] = solved[1]
    outdoorBefore = outdoor
  }
  return { air_C, radiant_C }
}

/** One hour of one wall: from [nodes, outdoor at start, outdoor at end, indoor] to its nodes and its mean inward flow per m². */
function wallStep(wall: WallChain) {
  const { rate, drive, film } = stateSpace(wall.system)
  const nodes = rate.length
  const outside = wall.system.boundaries.findIndex(({ name }) => name === 'outside')
  const inside = wall.system.boundaries.findIndex(({ name }) => name === 'inside')
  // States: nodes, integral of the nodes, outdoor, its slope, indoor.
  const size = 2 * nodes + 3
  const all: Rows = Array.from({ length: size }, () => new Array<number>(size).fill(0))
  for (let i = 0; i < nodes; i++) {
    for (let j = 0; j < nodes; j++) all[i][j] = rate[i][j] * HOUR_S
    all[i][2 * nodes] = drive[i][outside] * HOUR_S
    all[i][2 * nodes + 2] = drive[i][inside] * HOUR_S
    all[nodes + i][i] = 1
  }
  all[2 * nodes][2 * nodes + 1] = 1
  const step = expm(matrix(all)).toArray() as Rows
  const spread = (state: readonly number[]) => {
    const [start, end, indoor] = state.slice(nodes)
    return [...state.slice(0, nodes), ...new Array<number>(nodes).fill(0), start, end - start, indoor]
  }
  const times = (rows: Rows, state: readonly number[]) =>
    multiply(rows, spread(state) as MathNumericType[]) as unknown as number[]
  const filmTotal = film.reduce((sum, row) => sum + row[inside], 0)
  return {
    nodes,
    next: (state: readonly number[]) => times(step.slice(0, nodes), state),
    meanFlow: (state: readonly number[]) => {
      const means = times(step.slice(nodes, 2 * nodes), state)
      const indoor = state[nodes + 2]
      return filmTotal * indoor - means.reduce((sum, mean, i) => sum + film[i][inside] * mean, 0)
    },
  }
}

/**
 * The same room with nothing held constant: air and radiant node follow in continuous time; the massless
 * radiant node is eliminated. Hourly means of the air, by one matrix exponential of the whole network.
 */
export function continuousRoom(room: SmallRoom, outdoor_C: Float64Array, before_C: number): Float64Array {
  const parts = room.walls.map((wall) => ({ wall, ...stateSpace(wall.system) }))
  const first: number[] = []
  let air = 0
  for (const { rate } of parts) {
    first.push(air)
    air += rate.length
  }
  // States: nodes of all walls, air, integral of the air, outdoor, its slope, 1.
  const size = air + 5
  const [integral, outdoor, slope, one] = [air + 1, air + 2, air + 3, air + 4]
  const all: Rows = Array.from({ length: size }, () => new Array<number>(size).fill(0))
  // Each face passes its inputs through; T_face = u - q / film, q = film u - Σ film_n T_n.
  let radiative = 0
  for (const { wall } of parts) radiative += wall.radiative_Wm2K * wall.area_m2
  // Radiant node: Σ radiative (radiant - face) = 0, faces being the mean of the nodes behind the film.
  const faceRows = parts.map(({ wall, film }, w) => {
    const inside = wall.system.boundaries.findIndex(({ name }) => name === 'inside')
    const total = film.reduce((sum, row) => sum + row[inside], 0)
    const row = new Array<number>(size).fill(0)
    film.forEach((entry, i) => (row[first[w] + i] = entry[inside] / total))
    return row
  })
  const radiant = new Array<number>(size).fill(0)
  parts.forEach(({ wall }, w) => {
    const share = (wall.radiative_Wm2K * wall.area_m2) / radiative
    faceRows[w].forEach((value, i) => (radiant[i] += share * value))
  })
  parts.forEach(({ wall, rate, drive }, w) => {
    const outside = wall.system.boundaries.findIndex(({ name }) => name === 'outside')
    const inside = wall.system.boundaries.findIndex(({ name }) => name === 'inside')
    const film = wall.convective_Wm2K + wall.radiative_Wm2K
    rate.forEach((row, i) => {
      const at = first[w] + i
      row.forEach((value, j) => (all[at][first[w] + j] += value))
      all[at][outdoor] += drive[i][outside]
      all[at][air] += (drive[i][inside] * wall.convective_Wm2K) / film
      radiant.forEach((value, j) => (all[at][j] += (drive[i][inside] * wall.radiative_Wm2K * value) / film))
      all[at][one] += (drive[i][inside] * room.radiantGain_W * wall.radiantShare) / (film * wall.area_m2)
    })
    const convective_WK = wall.convective_Wm2K * wall.area_m2
    all[air][air] -= convective_WK / room.airCapacity_JK
    faceRows[w].forEach((value, j) => (all[air][j] += (convective_WK * value) / room.airCapacity_JK))
  })
  all[air][air] -= room.loss_WK / room.airCapacity_JK
  all[air][outdoor] += room.loss_WK / room.airCapacity_JK
  all[air][one] += room.convectiveGain_W / room.airCapacity_JK
  all[integral][air] = 1 / HOUR_S
  all[outdoor][slope] = 1 / HOUR_S
  const step = expm(matrix(all.map((row) => row.map((value) => value * HOUR_S)))).toArray() as Rows
  let state = new Array<number>(size).fill(room.start_C)
  state[one] = 1
  const out = new Float64Array(outdoor_C.length)
  let before = before_C
  for (let hour = 0; hour < outdoor_C.length; hour++) {
    state[integral] = 0
    state[outdoor] = before
    state[slope] = outdoor_C[hour] - before
    state = multiply(step, state as MathNumericType[]) as unknown as number[]
    out[hour] = state[integral]
    before = outdoor_C[hour]
  }
  return out
}

/** dT/dt = rate T + drive u, and the films themselves, all as full matrices. */
function stateSpace(system: ThermalSystem): { rate: Rows; drive: Rows; film: Rows } {
  const { size, halfWidth, data } = system.conductance_WK
  const rate: Rows = Array.from({ length: size }, () => new Array<number>(size).fill(0))
  const groups = system.boundaries.length
  const film: Rows = Array.from({ length: size }, () => new Array<number>(groups).fill(0))
  for (let i = 0; i < size; i++)
    for (let j = Math.max(0, i - halfWidth); j <= i; j++) {
      const value = data[i * (halfWidth + 1) + (j - i + halfWidth)]
      rate[i][j] = -value / system.capacity_JK[i]
      rate[j][i] = -value / system.capacity_JK[j]
    }
  system.boundaries.forEach(({ node, conductance_WK }, group) => {
    node.forEach((n, k) => (film[n][group] += conductance_WK[k]))
  })
  const drive = film.map((row, i) => row.map((value) => value / system.capacity_JK[i]))
  return { rate, drive, film }
}
