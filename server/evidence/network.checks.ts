import { layersSystem } from '#engine/conduction/layers.ts'
import type { LayersSpec } from '#engine/conduction/specs.ts'
import { HOURS, type ClimateYear } from '#engine/climate/climate-year.ts'
import { ledger } from '#engine/measures/ledger.ts'
import { setUniform } from '#engine/year/house-state.ts'
import { repeatingYear } from '#engine/year/repeating-year.ts'
import type { YearTrace } from '#engine/year/year-trace.ts'
import { assemble } from '#engine/zone/assemble.ts'
import type { HouseModel } from '#engine/zone/house-model.ts'
import { liveYear } from '#engine/zone/live-year.ts'
import { traceRecorder } from '#engine/zone/recorder.ts'
import { continuousRoom, hourMeanRoom, type SmallRoom } from './parts/network-reference.ts'
import { blindExposure, dullWeather, nothingHappens, steadyBox } from './parts/steady-box.ts'
import { check, type Check, type CheckGroup } from './check.ts'

/** The room against solvers and sums that know nothing of it. */
export const networkChecks: CheckGroup = {
  topic: 'The room as a network',
  run: () => [...matrixExponential(), ...steadySums(), ...decays()],
}

const OUTER_FILM = 25
const CONVECTIVE = 3
const RADIATIVE = 5
const START_C = 12
const COMPARED_H = 30 * 24

const EARTH_WALL: LayersSpec = {
  kind: 'layers',
  layers: [
    { name: 'board', thickness_m: 0.05, conductivity_WmK: 0.035, volumetricHeat_Jm3K: 42000 },
    { name: 'earth', thickness_m: 0.2, conductivity_WmK: 0.6, volumetricHeat_Jm3K: 1.6e6 },
  ],
  outsideFilm_Wm2K: OUTER_FILM,
  insideFilm_Wm2K: CONVECTIVE + RADIATIVE,
}
const THIN_WALL: LayersSpec = {
  kind: 'layers',
  layers: [{ name: 'timber', thickness_m: 0.03, conductivity_WmK: 0.13, volumetricHeat_Jm3K: 0.8e6 }],
  outsideFilm_Wm2K: OUTER_FILM,
  insideFilm_Wm2K: CONVECTIVE + RADIATIVE,
}
const WALLS = [
  { name: 'earth', spec: EARTH_WALL, area_m2: 30 },
  { name: 'timber', spec: THIN_WALL, area_m2: 12 },
]

/** A day that swings by 16 K on a week that swings by 10 K, by sines. */
const swingingOutdoor = () =>
  Float64Array.from(
    { length: HOURS },
    (_, i) =>
      8 -
      8 * Math.cos((2 * Math.PI * (i - 3)) / 24) +
      5 * Math.sin((2 * Math.PI * i) / HOURS) * Math.cos(i / 40),
  )

function matrixExponential(): Check[] {
  const alone = smallRoom(1)
  const furnished = smallRoom(5)
  const source = 'mathjs 15, expm and lusolve, on the same two walls'
  return [
    check({
      id: 'NETWORK/air',
      title: 'Room air over 30 days of hours, largest difference from the matrix exponential',
      source,
      provenance: 'derived',
      unit: 'K',
      expected: 0,
      tolerance: 1e-6,
      computed: largest(furnished.trace.air_C, furnished.same.air_C),
      note: 'Room temperatures constant within the hour on both sides, so that only rounding may differ.',
    }),
    check({
      id: 'NETWORK/radiant',
      title: 'Mean radiant temperature over 30 days of hours, largest difference from the matrix exponential',
      source,
      provenance: 'derived',
      unit: 'K',
      expected: 0,
      tolerance: 1e-6,
      computed: largest(furnished.trace.radiant_C, furnished.same.radiant_C),
    }),
    check({
      id: 'NETWORK/continuous',
      title:
        'Hourly means of the room air from the third day on, largest difference from a network in continuous time',
      source: 'mathjs 15, expm of the whole network',
      provenance: 'derived',
      unit: 'K',
      expected: 0,
      tolerance: 0.05,
      computed: largest(alone.trace.air_C, alone.flowing, 48),
      note: 'What it costs to hold the room constant within the hour while the outdoor air changes by up to 2 K in one. Tolerance: what the reduction of the ground may cost as well.',
    }),
    check({
      id: 'NETWORK/continuous-furnished',
      title: 'The same with light furniture, five times the capacity of the air',
      source: 'mathjs 15, expm of the whole network',
      provenance: 'derived',
      unit: 'K',
      expected: 0,
      tolerance: 0.1,
      computed: largest(furnished.trace.air_C, furnished.flowing, 48),
      note: 'Means of the hour stand for the ends of it in the store of the air, half an hour late: a store of 84 W/K that bends by 0.2 K in an hour, half of that against some 100 W/K, makes 0.08 K.',
    }),
  ]
}

/** The program's hours, and those of the two references. */
function smallRoom(airCapacityFactor: number) {
  const outdoor_C = swingingOutdoor()
  const model: HouseModel = {
    ...nothingHappens,
    room: { floorArea_m2: 20, volume_m3: 50, depth_m: 4, airCapacityFactor },
    elements: WALLS.map(({ name, spec, area_m2 }) => ({
      name,
      spec,
      size: area_m2,
      links: {
        outside: { to: 'outdoor', exposure: blindExposure(OUTER_FILM) },
        inside: {
          to: 'room',
          surface: {
            name,
            area_m2,
            convective_Wm2K: CONVECTIVE,
            radiative_Wm2K: RADIATIVE,
            solarAbsorptance: 0.6,
            part: 'wall',
            faces_deg: null,
          },
        },
      },
    })),
    windows: [],
    plainLoss_WK: 20,
    gains: {
      convective_W: new Array<number>(24).fill(150),
      radiative_W: new Array<number>(24).fill(300),
    },
  }
  const house = assemble(model, dullWeather(outdoor_C))
  for (const element of house.elements) setUniform(element, START_C)
  house.air.start_C = START_C
  const trace = liveOnce(house)

  const area_m2 = WALLS.reduce((sum, wall) => sum + wall.area_m2, 0)
  const room: SmallRoom = {
    walls: WALLS.map((wall) => ({
      system: layersSystem(wall.spec),
      area_m2: wall.area_m2,
      convective_Wm2K: CONVECTIVE,
      radiative_Wm2K: RADIATIVE,
      radiantShare: wall.area_m2 / area_m2,
    })),
    airCapacity_JK: house.airCapacity_JK,
    loss_WK: 20,
    convectiveGain_W: 150,
    radiantGain_W: 300,
    start_C: START_C,
  }
  const outdoor = outdoor_C.subarray(0, COMPARED_H)
  const before_C = outdoor_C[HOURS - 1]
  return {
    trace,
    same: hourMeanRoom(room, outdoor, before_C),
    flowing: continuousRoom(room, outdoor, before_C),
  }
}

function liveOnce(house: ReturnType<typeof assemble>): YearTrace {
  const recorder = traceRecorder(house, 0, false)
  liveYear(house, 0, null, recorder)
  return recorder.trace()
}

const largest = (a: Float64Array, b: Float64Array, from = 0): number => {
  let worst = 0
  for (let i = from; i < Math.min(a.length, b.length); i++) worst = Math.max(worst, Math.abs(a[i] - b[i]))
  return worst
}

function steadySums(): Check[] {
  const still = dullWeather(0)
  const run = (gains_W: number, set_C: number | null, climate: ClimateYear = still) =>
    repeatingYear(assemble(steadyBox('light', gains_W, set_C), climate), { closure_K: 1e-4 }).trace
  const box = 'ANSI/ASHRAE Standard 140, case 600 layers and films, sums recomputed'
  const last = HOURS - 1
  const ua = (kind: 'light' | 'heavy') => {
    const house = assemble(steadyBox(kind, 0, null), still)
    let sum = house.model.plainLoss_WK
    for (const { reduced, room, size } of house.elements) {
      const [{ group }] = room
      const groups = reduced.boundaries.length
      let flow = reduced.conductance_WK[group]
      for (let k = 0; k < reduced.modes; k++)
        flow -= reduced.gain[k * groups + group] ** 2 / reduced.decay_s[k]
      sum += flow * size
    }
    return sum
  }
  const balanced = repeatingYear(
    assemble(steadyBox('heavy', 200, 20, 0.6), dullWeather(swingingOutdoor())),
  ).trace
  const books = ledger(balanced)
  return [
    check({
      id: 'ZON-01/light',
      title: 'Conduction of the light test box, walls, floor, roof and windows, from the modes',
      source: box,
      provenance: 'derived',
      unit: 'W/K',
      expected: 85.86,
      tolerance: 0.05,
      computed: ua('light'),
    }),
    check({
      id: 'ZON-01/heavy',
      title: 'Conduction of the heavy test box, walls, floor, roof and windows, from the modes',
      source: box.replace('600', '900'),
      provenance: 'derived',
      unit: 'W/K',
      expected: 85.71,
      tolerance: 0.05,
      computed: ua('heavy'),
    }),
    check({
      id: 'ZON-02/free',
      title: 'Box without sun and gains, 0 °C outdoors and 10 °C under the floor',
      source: box,
      provenance: 'derived',
      unit: '°C',
      expected: 0.1823,
      tolerance: 0.01,
      computed: run(0, null).air_C[last],
    }),
    check({
      id: 'ZON-02/gains',
      title: 'The same box with 200 W of gains',
      source: box,
      provenance: 'derived',
      unit: '°C',
      expected: 2.1095,
      tolerance: 0.01,
      computed: run(200, null).air_C[last],
    }),
    check({
      id: 'ZON-02/heating',
      title: 'Heat that holds the same box at 20 °C, without gains',
      source: box,
      provenance: 'derived',
      unit: 'W',
      expected: 2056.64,
      tolerance: 1,
      computed: run(0, 20).heating_W[last],
    }),
    check({
      id: 'ZON-03/year',
      title:
        'Heavy box in swinging weather: all flows of the year minus the growth of all stores, over the throughput',
      source: 'Conservation of energy',
      provenance: 'derived',
      unit: '%',
      expected: 0,
      tolerance: 0.01,
      computed: (100 * Math.abs(books.house.residual.year_kWh)) / books.house.throughput_kWh,
    }),
    check({
      id: 'ZON-03/hours',
      title: 'The same hour by hour, so that errors cannot cancel',
      source: 'Conservation of energy',
      provenance: 'derived',
      unit: '1',
      expected: 0,
      tolerance: 1e-6,
      computed: Math.max(books.house.residualShare, books.room.residualShare),
    }),
  ]
}

/** One capacity and one resistance, 10 h: 20 °C falls towards 0 °C. */
function decays(): Check[] {
  const still = dullWeather(0)
  const afterADay = (model: HouseModel, value: (trace: YearTrace) => number) => {
    const house = assemble(model, still)
    for (const element of house.elements) setUniform(element, 20)
    house.air.start_C = 20
    return value(liveOnce(house))
  }
  const body = (capacity_JK: number, conductance_WK: number): HouseModel['elements'][number] => ({
    name: 'body',
    spec: { kind: 'lumped', capacity_JK, conductance_WK },
    size: 1,
    links: {
      inside: {
        to: 'room',
        surface: {
          name: 'body',
          area_m2: conductance_WK / 8,
          convective_Wm2K: 8 * (1 - 1e-9),
          radiative_Wm2K: 8e-9,
          solarAbsorptance: 0.5,
          part: 'mass',
          faces_deg: null,
        },
      },
    },
  })
  const airHeat = 1.2041 * 1006
  const volume_m3 = 100
  return [
    check({
      id: 'OPQ-11/house/body',
      title: 'A body of 3.6 MJ/K behind 0.01 K/W in a house as cold as outdoors, after 24 h from 20 °C',
      source: 'Exponential decay with a time constant of 10 h',
      provenance: 'derived',
      unit: '°C',
      expected: 20 * Math.exp(-2.4),
      tolerance: 0.001,
      computed: afterADay(
        {
          ...nothingHappens,
          room: { floorArea_m2: 40, volume_m3, depth_m: 5, airCapacityFactor: 1 },
          elements: [body(3.6e6, 100)],
          windows: [],
          plainLoss_WK: 1e8,
        },
        (trace) => trace.elements[0].stored_J[23] / 3.6e6,
      ),
      note: 'Elements take exact steps: only the air, held at outdoors by a very large loss, stands between.',
    }),
    check({
      id: 'OPQ-11/house/air',
      title: 'Room air of 3.6 MJ/K alone behind 0.01 K/W, after 24 h from 20 °C',
      source: 'Implicit Euler steps of one hour, 20 (1 + 0.1)^-24; exact would be 1.8144',
      provenance: 'derived',
      unit: '°C',
      expected: 20 * 1.1 ** -24,
      tolerance: 0.001,
      computed: afterADay(
        {
          ...nothingHappens,
          room: {
            floorArea_m2: 40,
            volume_m3,
            depth_m: 5,
            airCapacityFactor: 3.6e6 / (airHeat * volume_m3),
          },
          elements: [body(1, 1e-6)],
          windows: [],
          plainLoss_WK: 100,
        },
        (trace) => trace.air_C[23],
      ),
      note: 'The room air is a mean of the hour and no store of weight in a real house: what mass holds is stepped exactly.',
    }),
  ]
}
