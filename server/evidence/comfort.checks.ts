import {
  ASHRAE_55,
  EN_16798,
  comfortTemperature,
  countComfort,
  nextRunningMean,
  operativeTemperature,
  sevenDayRunningMean,
  type AdaptiveModel,
} from '#engine/measures/comfort.ts'
import { FRESH_AIR_RULES } from '#engine/measures/fresh-air.ts'
import { saturationPressure } from '#engine/measures/moist-air.ts'
import { predictedVote } from '#engine/measures/predicted-vote.ts'
import { check, type Check, type CheckGroup, type EvidenceInputs } from './check.ts'

/** Comfort limits, running mean, predicted vote and fresh air. */
export const comfortChecks: CheckGroup = {
  topic: 'Comfort and fresh air',
  run: (inputs) => [
    ...adaptiveLines('CMF-01', EN_16798, { 10: 22.1, 15: 23.75, 20: 25.4, 25: 27.05, 30: 28.7 }),
    ...adaptiveLimits('CMF-01', EN_16798, { I: [22.4, 27.4], II: [21.4, 28.4], III: [20.4, 29.4] }),
    ...runningMean(),
    ...adaptiveLines('CMF-03', ASHRAE_55, { 10: 20.9, 15: 22.45, 20: 24, 25: 25.55, 30: 27.1, 33.5: 28.185 }),
    ...adaptiveLimits('CMF-03', ASHRAE_55, { '80 %': [20.5, 27.5], '90 %': [21.5, 26.5] }),
    ...votes(inputs),
    operative(),
    ...freshAir(),
  ],
}

function adaptiveLines(id: string, model: AdaptiveModel, rows: Record<number, number>): Check[] {
  return Object.entries(rows).map(([outdoor, expected]) =>
    check({
      id: `${id}/${outdoor}`,
      title: `Comfort temperature at a running mean of ${outdoor} °C`,
      source: model.source,
      provenance: 'from memory',
      unit: '°C',
      expected,
      tolerance: 1e-6,
      computed: comfortTemperature(model, Number(outdoor)) ?? NaN,
    }),
  )
}

/** The limits as the counting of hours really uses them: degree-hours of one year held at 0 and at 50 °C. */
function adaptiveLimits(
  id: string,
  model: AdaptiveModel,
  rows: Record<string, readonly [low: number, high: number]>,
): Check[] {
  const middle = comfortTemperature(model, 20)!
  return Object.entries(rows).flatMap(([name, limits]) => {
    const category = model.categories.find((each) => each.name === name)!
    const count = (level_C: number) =>
      countComfort(name, model.source, new Float64Array(8760).fill(level_C), () => [
        middle - category.below_K,
        middle + category.above_K,
      ])
    const computed = [count(0).below_Kh / 8760, 50 - count(50).above_Kh / 8760]
    return limits.map((expected, i) =>
      check({
        id: `${id}/${name.replaceAll(' ', '')}/${i === 0 ? 'low' : 'high'}`,
        title: `${i === 0 ? 'Lower' : 'Upper'} limit of category ${name} at a running mean of 20 °C`,
        source: model.source,
        provenance: 'from memory',
        unit: '°C',
        expected,
        tolerance: 1e-6,
        computed: computed[i],
      }),
    )
  })
}

function runningMean(): Check[] {
  const source = 'EN 16798-1:2019, B.2.2 (formula from memory)'
  return [
    check({
      id: 'CMF-02/next-day',
      title: 'Running mean after 20 °C yesterday and a running mean of 15 °C',
      source,
      provenance: 'derived',
      unit: '°C',
      expected: 16,
      tolerance: 1e-4,
      computed: nextRunningMean(20, 15),
    }),
    check({
      id: 'CMF-02/seven-days',
      title: 'Running mean from seven days, newest first 20 22 18 16 19 21 23 °C',
      source,
      provenance: 'derived',
      unit: '°C',
      expected: 19.7105,
      tolerance: 1e-4,
      computed: sevenDayRunningMean([20, 22, 18, 16, 19, 21, 23]),
    }),
  ]
}

function votes(inputs: EvidenceInputs): Check[] {
  const source = 'ISO 7730:2005, Table D.1'
  const rows = inputs.published('iso7730-table-d1.csv').map((text) => {
    const row = Object.fromEntries(Object.entries(text).map(([key, value]) => [key, Number(value)]))
    const found = predictedVote({
      air_C: row.air_C,
      radiant_C: row.radiant_C,
      airSpeed_ms: row.airSpeed_ms,
      vapour_Pa: (row.humidity_pct / 100) * saturationPressure(row.air_C),
      activity_met: row.activity_met,
      work_met: 0,
      clothing_clo: row.clothing_clo,
    })
    return { row, found }
  })
  const largest = (values: number[]) =>
    values.reduce((a, b) => Math.max(a, Math.abs(b)), rows.length ? 0 : NaN)
  const few = [0, 1, 5, 11].map((i) => {
    const { row, found } = rows[i]
    return check({
      id: `CMF-04/${i + 1}/vote`,
      title: `Predicted mean vote at ${row.air_C} °C, ${row.airSpeed_ms} m/s, ${row.activity_met} met, ${row.clothing_clo} clo`,
      source,
      provenance: 'from memory',
      unit: '-',
      expected: row.vote,
      tolerance: 0.02,
      computed: found.vote,
      note: 'Printed to two places; the iteration of the published code stops at 0.015 K.',
    })
  })
  return [
    ...few,
    check({
      id: 'CMF-04/all/vote',
      title: `Largest deviation of ${rows.length} predicted mean votes`,
      source,
      provenance: 'from memory',
      unit: '-',
      expected: 0,
      tolerance: 0.02,
      computed: largest(rows.map(({ row, found }) => found.vote - row.vote)),
    }),
    check({
      id: 'CMF-04/all/dissatisfied',
      title: `Largest deviation of ${rows.length} percentages dissatisfied`,
      source,
      provenance: 'from memory',
      unit: '%',
      expected: 0,
      tolerance: 1,
      computed: largest(rows.map(({ row, found }) => found.dissatisfied_pct - row.dissatisfied_pct)),
      note: 'Printed as whole per cent.',
    }),
  ]
}

function operative(): Check {
  return check({
    id: 'CMF-05',
    title: 'Operative temperature of 20 °C air and 24 °C radiant below 0.2 m/s',
    source: 'ISO 7726; ANSI/ASHRAE Standard 55',
    provenance: 'from memory',
    unit: '°C',
    expected: 22,
    tolerance: 1e-9,
    computed: operativeTemperature(20, 24),
  })
}

/** The dwelling of 1,000 ft², three bedrooms, 8 ft high, in cubic feet a minute. */
function freshAir(): Check[] {
  const dwelling = { people: 2, bedrooms: 3, floorArea_m2: 92.90304, volume_m3: 226.53477 }
  const rows = [
    { rule: 0, id: 'changes', expected: 47, tolerance: 0.5, note: 'Stated in whole cfm.' },
    { rule: 1, id: 'before-2013', expected: 40, tolerance: 0.01 },
    { rule: 2, id: 'from-2013', expected: 60, tolerance: 0.01 },
  ]
  return rows.map(({ rule, id, expected, tolerance, note }) => {
    const { name, source, least_m3s } = FRESH_AIR_RULES[rule]
    return check({
      id: `AIR-01/${id}`,
      title: `Least fresh air of a 1,000 ft² dwelling with three bedrooms: ${name}`,
      source,
      provenance: 'derived',
      unit: 'cfm',
      expected,
      tolerance,
      computed: least_m3s(dwelling) / (0.3048 ** 3 / 60),
      note,
    })
  })
}
