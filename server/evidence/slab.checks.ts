import { reduce } from '#engine/conduction/reduce.ts'
import { undisturbedGround } from '#engine/climate/ground.ts'
import { penetrationDepth } from '#engine/conduction/periodic-depth.ts'
import { check, type Check, type CheckGroup } from './check.ts'
import { chain, deepGround, drive, FIXED, modes, sineOf } from './parts/drive-layers.ts'

/** Deep ground in one dimension, by the modes and hourly steps that the house uses. */
export const slabChecks: CheckGroup = {
  topic: 'Deep ground, one dimension',
  run: () => [
    ...depths(),
    ...yearlyWave(),
    ...throughFilm(),
    ...step(),
    ...stepThroughFilm(),
    ...waterMain(),
    ...charging(),
    ...halfYear(),
  ],
}

const DAY_H = 24
const YEAR_H = 8760
const YEAR_S = YEAR_H * 3600
const CLAY = { conductivity_WmK: 1.5, volumetricHeat_Jm3K: 3.0e6 }
const sine = (period_s: number) => (_: number, time_s: number) => Math.sin((2 * Math.PI * time_s) / period_s)
/** By how much a value that lags up to a whole period is behind. */
const late = (hours: number, period_h: number) => ((hours % period_h) + period_h) % period_h

const derived = (
  id: string,
  title: string,
  source: string,
  unit: string,
  expected: number,
  tolerance: number,
  computed: number,
  note?: string,
): Check => check({ id, title, source, provenance: 'derived', unit, expected, tolerance, computed, note })

function depths(): Check[] {
  const rows: [string, number, number, number][] = [
    ['clay or silt', 1.5, 3.0e6, 2.24],
    ['sand or gravel', 2.0, 2.0e6, 3.168],
    ['rock', 3.5, 2.0e6, 4.191],
  ]
  return rows.map(([name, conductivity_WmK, volumetricHeat_Jm3K, expected]) =>
    derived(
      `GND-01/${name}`,
      `Penetration depth of the year in ${name}`,
      'ISO 13370:2017, Tables 7 and H.1 (2.2, 3.2 and 4.2 m); √(λ T / (π ρ c)), T = 365 d',
      'm',
      expected,
      0.001,
      penetrationDepth({ conductivity_WmK, volumetricHeat_Jm3K }, YEAR_S),
    ),
  )
}

/** Temperatures at some depths below a surface of ±1 K over the year, from the exact start, in the third year. */
function thirdYear(conductivity_WmK: number, volumetricHeat_Jm3K: number, depth_m: readonly number[]) {
  const system = deepGround(conductivity_WmK, volumetricHeat_Jm3K, FIXED, depth_m)
  const below = nodeDepths(system.capacity_JK, volumetricHeat_Jm3K)
  // sin ωt is coldest three quarters through the year.
  const wave = {
    mean_C: 0,
    amplitude_K: 1,
    coldest_s: 0.75 * YEAR_S,
    diffusivity_m2s: conductivity_WmK / volumetricHeat_Jm3K,
  }
  return drive(
    modes(system, { start_C: undisturbedGround(wave, below, 0) }),
    3 * YEAR_H,
    depth_m.length,
    sine(YEAR_S),
  )
}

/** Depths below the inner face, the last node, of a chain of one substance, from what half cells hold. */
function nodeDepths(capacity_JK: Float64Array, volumetricHeat_Jm3K: number): Float64Array {
  const out = new Float64Array(capacity_JK.length)
  let cell_m = 0
  for (let i = out.length - 2; i >= 0; i--) {
    cell_m = (2 * capacity_JK[i + 1]) / volumetricHeat_Jm3K - cell_m
    out[i] = out[i + 1] + cell_m
  }
  return out.map((depth) => Math.max(0, depth))
}

function yearlyWave(): Check[] {
  const source = 'Carslaw and Jaeger 1959, 2.6'
  const rows = [
    [1, 6.4, 25.93],
    [2, 4.095, 51.86],
    [3, 2.621, 77.79],
    [5, 1.073, 129.65],
    [7, 0.44, 181.51],
    [10, 0.115, 259.3],
  ]
  const { probe, flow } = thirdYear(
    CLAY.conductivity_WmK,
    CLAY.volumetricHeat_Jm3K,
    rows.map(([depth]) => depth),
  )
  const heat = sineOf(flow[0], YEAR_H, 0.5)
  return [
    ...rows.flatMap(([depth, amplitude, lag_d], i) => {
      const found = sineOf(probe[i], YEAR_H, 1)
      return [
        derived(
          `GND-02/${depth}m/amplitude`,
          `Yearly wave of 10 K in clay, amplitude at ${depth} m`,
          source,
          'K',
          amplitude,
          0.01 * amplitude,
          10 * found.amplitude,
        ),
        derived(
          `GND-02/${depth}m/lag`,
          `Yearly wave in clay, delay at ${depth} m`,
          source,
          'd',
          lag_d,
          1,
          late(found.late_h, YEAR_H) / 24,
        ),
      ]
    }),
    derived(
      'GND-02/flux',
      'Yearly wave of 10 K in clay, amplitude of the flux at the surface',
      source,
      'W/m²',
      9.469,
      0.01 * 9.469,
      10 * heat.amplitude,
    ),
    derived(
      'GND-02/flux-lead',
      'Flux at the surface ahead of its temperature',
      source,
      'd',
      45.6,
      1,
      -heat.late_h / 24,
    ),
  ]
}

function throughFilm(): Check[] {
  const source = 'Carslaw and Jaeger 1959, 2.6: 1 / √(1 + 2e + 2e²), atan(e / (1 + e)), e = λ / (h d)'
  const run = (period_h: number, periods: number) => {
    const system = deepGround(CLAY.conductivity_WmK, CLAY.volumetricHeat_Jm3K, 25, [0])
    const { probe } = drive(modes(system), periods * period_h, 1, sine(period_h * 3600))
    return sineOf(probe[0], period_h, 1)
  }
  const year = run(YEAR_H, 10)
  const day = run(DAY_H, 60)
  return [
    derived(
      'GND-03/year',
      'Clay under a film of 25 W/m²K: swing of the surface over the year, of 1',
      source,
      '1',
      0.9736,
      0.01,
      year.amplitude,
    ),
    derived('GND-03/year-lag', 'Its delay behind the air', source, 'd', 1.515, 0.1, year.late_h / 24),
    derived(
      'GND-03/day',
      'Clay under a film of 25 W/m²K: swing of the surface over the day, of 1',
      source,
      '1',
      0.6266,
      0.01 * 0.6266,
      day.amplitude,
      'Tolerance: 1 %; hourly inputs, linear between, take 0.6 % off a daily sine themselves.',
    ),
    derived('GND-03/day-lag', 'Its delay behind the air', source, 'h', 1.247, 0.1, day.late_h),
  ]
}

function step(): Check[] {
  const depth_m = [1, 3, 6]
  const days = [30, 182.5, 365, 1095]
  const rows = [
    [0.53451, 0.80117, 0.85867, 0.91811],
    [0.06241, 0.44995, 0.59319, 0.75775],
    [0.00019, 0.13079, 0.28532, 0.53733],
  ]
  const system = deepGround(CLAY.conductivity_WmK, CLAY.volumetricHeat_Jm3K, FIXED, depth_m)
  const { probe } = drive(modes(system), 1095 * 24, depth_m.length, () => 1)
  return rows.flatMap((row, i) =>
    row.map((expected, n) =>
      derived(
        `GND-04/${depth_m[i]}m/${days[n]}d`,
        `Ground at 0, surface at 1: ${depth_m[i]} m deep after ${days[n]} days`,
        'Carslaw and Jaeger 1959, 2.4: erfc',
        '1',
        expected,
        0.003,
        probe[i][days[n] * 24 - 1],
      ),
    ),
  )
}

function stepThroughFilm(): Check[] {
  const depth_m = [0, 0.5, 1]
  const days = [1, 7, 30]
  const rows = [
    [0.84321, 0.9388, 0.97031],
    [0.0611, 0.47282, 0.72816],
    [0.00038, 0.17411, 0.51058],
  ]
  const system = deepGround(CLAY.conductivity_WmK, CLAY.volumetricHeat_Jm3K, 25, depth_m)
  const { probe } = drive(modes(system), 30 * 24, depth_m.length, () => 1)
  return rows.flatMap((row, i) =>
    row.map((expected, n) =>
      derived(
        `GND-05/${depth_m[i]}m/${days[n]}d`,
        `Ground at 0, air at 1 over a film of 25 W/m²K: ${depth_m[i]} m deep after ${days[n]} days`,
        'Carslaw and Jaeger 1959, 2.7',
        '1',
        expected,
        0.003,
        probe[i][days[n] * 24 - 1],
      ),
    ),
  )
}

function waterMain(): Check[] {
  const depth_m = Array.from({ length: 9 }, (_, i) => 0.6 + 0.02 * i)
  const element = modes(deepGround(0.52, 2050 * 1840, FIXED, depth_m))
  element.setUniform(20)
  const { probe } = drive(element, 60 * 24, depth_m.length, () => -15)
  const last = probe.map((series) => series[60 * 24 - 1])
  const i = last.findIndex((value) => value > 0)
  const frost_m = i > 0 ? depth_m[i - 1] + (0.02 * -last[i - 1]) / (last[i] - last[i - 1]) : NaN
  return [
    check({
      id: 'GND-06',
      title: 'Depth of frost below a surface of -15 °C for 60 days, soil at 20 °C before',
      source: 'F. P. Incropera et al., Fundamentals of Heat and Mass Transfer, example 5.6 or 5.7: 0.68 m',
      provenance: 'from memory',
      unit: 'm',
      expected: 0.677,
      tolerance: 0.01,
      computed: frost_m,
    }),
  ]
}

function charging(): Check[] {
  const length_m = 6.096
  const slab = (diffusivity_m2s: number) =>
    chain(
      [{ thickness_m: length_m, conductivity_WmK: 3e6 * diffusivity_m2s, volumetricHeat_Jm3K: 3e6 }],
      { outside: 0, inside: FIXED },
      [],
      { refinement: 4 },
    )
  const source = 'Carslaw and Jaeger 1959, 3.3: slowest time constant 4 L² / (π² a)'
  const element = modes(slab(5e-7))
  const capacity_J = 3e6 * length_m
  let gained_J = 0
  const { flow } = drive(element, 5 * YEAR_H, 0, () => 1)
  const stored = flow[0].map((value) => (gained_J += 3600 * value) / capacity_J)
  return [
    ...[3e-7, 4e-7, 5e-7, 7.5e-7].map((diffusivity) =>
      derived(
        `GND-12/${diffusivity}`,
        `20 ft of earth of ${diffusivity} m²/s, far side insulated: slowest time constant`,
        source,
        'a',
        (4 * length_m ** 2) / (Math.PI ** 2 * diffusivity) / YEAR_S,
        0.005,
        1 / reduce(slab(diffusivity)).decay_s[0] / YEAR_S,
      ),
    ),
    ...[0.7155, 0.9001, 0.9649, 0.9877, 0.9957].map((expected, i) =>
      derived(
        `GND-12/stored/${i + 1}`,
        `Share of its heat that 20 ft of earth hold ${i + 1} years after a step, 5e-7 m²/s`,
        source,
        '1',
        expected,
        0.005,
        stored[(i + 1) * YEAR_H - 1],
      ),
    ),
  ]
}

function halfYear(): Check[] {
  const source = 'Carslaw and Jaeger 1959, 2.6'
  const depths: [string, number, number, number][] = [
    ['clay', 1.5, 3.0e6, 7.04],
    ['sand', 2.0, 2.0e6, 9.95],
    ['dry soil of 0.75 W/mK', 0.75, 2.0e6, 6.1],
  ]
  const rows = [
    [2.5e-7, 223.5],
    [3.75e-7, 182.5],
    [5e-7, 158.1],
    [7.5e-7, 129.1],
    [10e-7, 111.8],
  ]
  const feet20_m = 6.096
  return [
    ...depths.map(([name, conductivity_WmK, volumetricHeat_Jm3K, expected]) =>
      derived(
        `GND-13/depth/${name}`,
        `Depth at which ${name} is half a year late`,
        source,
        'm',
        expected,
        0.01,
        Math.PI * penetrationDepth({ conductivity_WmK, volumetricHeat_Jm3K }, YEAR_S),
      ),
    ),
    ...rows.map(([diffusivity, lag_d]) => {
      const { probe } = thirdYear(2e6 * diffusivity, 2e6, [feet20_m])
      return derived(
        `GND-13/20ft/${diffusivity}`,
        `Delay of the year at 20 ft in soil of ${diffusivity} m²/s, hourly steps`,
        source,
        'd',
        lag_d,
        1,
        late(sineOf(probe[0], YEAR_H, 1).late_h, YEAR_H) / 24,
      )
    }),
  ]
}
