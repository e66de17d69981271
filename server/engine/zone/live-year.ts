import { HOURS, HOUR_S } from '../climate/climate-year.ts'
import type { SteppedElement } from '../conduction/full-run.ts'
import { leakageFlow } from './air.ts'
import type { RunningHouse } from './assemble.ts'
import type { RunningElement } from './running-element.ts'
import { hourWithin } from '../climate/calendar.ts'
import type { PlantModel } from './house-model.ts'
import type { Recorder } from './recorder.ts'

/**
 * Lives 8,760 hours from the state of the house, and leaves it at the end of the last.
 *
 * Each hour: every element answers with its history (what its modes give whatever the room does) plus
 * its response times the room's present temperatures; air and mean radiant temperature follow from two
 * equations; backup heat by linearity, from what 1 W would do; then all modes take one exact step.
 * The room's temperatures are means of the hour and count as constant within it, since a room without
 * capacity that is only held at the end of the hour would swing from hour to hour; outdoor temperatures run
 * linearly within the hour. Rules (flush, stack) look at the hour before.
 *
 * @param house      its element states and `air.start_C` are read and written
 * @param firstHour  hour of the year to begin with, 0 to 8,759; the year runs on past its end
 * @param faces_C    receives the face temperatures, `faces_C[hour * faces + k]`; null to leave out
 * @param recorder   receives everything of each hour; null to leave out
 */
export function liveYear(
  house: RunningHouse,
  firstHour: number,
  faces_C: Float64Array | null,
  recorder: Recorder | null,
): void {
  const { elements, faces, windows, climate, model, sunOnAir_W, sunOnRadiant_W, month } = house
  const { outdoor_C, wind_ms } = climate
  const faceCount = faces.length
  const convective = Float64Array.from(faces, (face) => face.convective)
  const radiative = Float64Array.from(faces, (face) => face.radiative)
  const film_WK = Float64Array.from(faces, (face) => face.film_WK)
  const radiantShare = Float64Array.from(faces, (face) => face.radiantShare)
  const absorbed_W = faces.map((face) => face.absorbed_W)
  const history_W = new Float64Array(faceCount)
  const faceFlow_W = new Float64Array(faceCount)
  const capacity_WK = house.airCapacity_JK / HOUR_S
  const { infiltration, ventilation, flush, gains, heating, cooling } = model
  const fixed_m3s =
    infiltration.kind === 'fixed' ? (infiltration.changes_h * model.room.volume_m3) / HOUR_S : 0
  const flush_m3s = flush ? (flush.changes_h * model.room.volume_m3) / HOUR_S : 0
  const flushMonth = new Set(flush?.months ?? [])

  let air = house.air.start_C
  let outdoorBefore = outdoor_C[(firstHour + HOURS - 1) % HOURS]
  for (let step = 0; step < HOURS; step++) {
    const hour = firstHour + step < HOURS ? firstHour + step : firstHour + step - HOURS
    const before = hour === 0 ? HOURS - 1 : hour - 1
    const hourOfDay = hour % 24

    // What the elements bring from before, and the right-hand sides of the room.
    let onAir = sunOnAir_W[hour] + windows.onAir_W[hour]
    let onRadiant = sunOnRadiant_W[hour] + windows.onRadiant_W[hour]
    for (let e = 0; e < elements.length; e++) {
      const element = elements[e]
      drive(element, hour, before)
      if (element.full) element.full.stepper.startHour(element.full.history_W)
      const room = element.room
      for (let r = 0; r < room.length; r++) {
        const { face, group } = room[r]
        const heat = knownFlow(element, group)
        history_W[face] = heat
        onAir -= convective[face] * heat
        onRadiant -= radiative[face] * heat
      }
    }

    // Air from outdoors.
    const outdoorMean = 0.5 * (outdoorBefore + outdoor_C[hour])
    const infiltration_m3s =
      infiltration.kind === 'fixed'
        ? fixed_m3s
        : leakageFlow(
            infiltration.area_cm2,
            infiltration.stack,
            infiltration.wind,
            air - outdoorBefore,
            wind_ms[hour],
          )
    const fresh_m3s = ventilation.fresh_m3s[hourOfDay]
    const isFlushing =
      flush !== null &&
      flushMonth.has(month[hour] + 1) &&
      hourWithin(hourOfDay, flush.from_h, flush.to_h) &&
      air > flush.above_C &&
      air - outdoorBefore >= flush.byAtLeast_K
    const infiltration_WK = house.airHeat_Jm3K * infiltration_m3s
    const fresh_WK = house.airHeat_Jm3K * fresh_m3s * (1 - ventilation.recovery)
    const flush_WK = isFlushing ? house.airHeat_Jm3K * flush_m3s : 0
    const outdoorAir_WK = infiltration_WK + fresh_WK + flush_WK + model.plainLoss_WK

    const convectiveGain = gains.convective_W[hourOfDay]
    onAir += outdoorAir_WK * outdoorMean + convectiveGain + capacity_WK * air
    const aa = house.matrix.aa + windows.aa[hour] + outdoorAir_WK + capacity_WK
    const ar = house.matrix.ar + windows.ar[hour]
    const rr = house.matrix.rr + windows.rr[hour]
    const determinant = aa * rr - ar * ar
    let airNow = (rr * onAir - ar * onRadiant) / determinant
    let radiantNow = (aa * onRadiant - ar * onAir) / determinant

    let heating_W = 0
    let cooling_W = 0
    let radiantPower_W = 0
    const plant = wanted(heating, hourOfDay, month[hour], airNow, radiantNow, 1)
      ? heating
      : wanted(cooling, hourOfDay, month[hour], airNow, radiantNow, -1)
        ? cooling
        : null
    if (plant) {
      const share = plant.convectiveShare
      const unitAir = share + (1 - share) * house.radiantOnAir
      const unitRadiant = (1 - share) * house.radiantOnRadiant
      const perWattAir = (rr * unitAir - ar * unitRadiant) / determinant
      const perWattRadiant = (aa * unitRadiant - ar * unitAir) / determinant
      const felt = plant.senses === 'air' ? airNow : 0.5 * (airNow + radiantNow)
      const perWatt = plant.senses === 'air' ? perWattAir : 0.5 * (perWattAir + perWattRadiant)
      const needed = (plant.set_C[hourOfDay]! - felt) / perWatt
      const power = plant === heating ? Math.min(needed, plant.power_W) : Math.max(needed, -plant.power_W)
      airNow += power * perWattAir
      radiantNow += power * perWattRadiant
      radiantPower_W = (1 - share) * power
      if (plant === heating) heating_W = power
      else cooling_W = -power
    }

    // Hand the room's temperatures to the faces; close the hour.
    for (let e = 0; e < elements.length; e++) {
      const element = elements[e]
      const { room, input, columns, response } = element
      for (let r = 0; r < room.length; r++) {
        const { face, column } = room[r]
        const heat = absorbed_W[face][hour] + radiantPower_W * radiantShare[face]
        input[column] = convective[face] * airNow + radiative[face] * radiantNow + heat / film_WK[face]
      }
      for (let r = 0; r < room.length; r++) {
        const { face, group } = room[r]
        let flow = history_W[face]
        for (let c = 0; c < room.length; c++) {
          const column = room[c].column
          flow += response[group * columns + column] * input[column]
        }
        faceFlow_W[face] = flow
        if (faces_C) faces_C[hour * faceCount + face] = input[room[r].column] - flow / film_WK[face]
      }
      if (recorder) recorder.outside(e, hour, element)
      advance(element)
      if (recorder) recorder.element(e, hour, element)
    }
    if (recorder) {
      const windowLoss_W =
        windows.lossAir_WK[hour] * airNow +
        windows.lossRadiant_WK[hour] * radiantNow -
        windows.lossOutdoor_W[hour]
      const drop = outdoorMean - airNow
      recorder.room(hour, airNow, radiantNow, faceFlow_W, {
        heating_W,
        cooling_W,
        windows_W: -windowLoss_W + model.plainLoss_WK * drop,
        infiltration_W: infiltration_WK * drop,
        ventilation_W: fresh_WK * drop,
        flush_W: flush_WK * drop,
        outdoorAir_m3s: infiltration_m3s + fresh_m3s + (isFlushing ? flush_m3s : 0),
      })
    }
    air = airNow
    outdoorBefore = outdoor_C[hour]
  }
  house.air.start_C = air
}

/** Writes the outdoor columns of an element's input for this hour. */
function drive(element: RunningElement, hour: number, before: number): void {
  const { outdoor, input } = element
  for (let i = 0; i < outdoor.length; i++) {
    const { column, drive } = outdoor[i]
    const sun = drive.step_K[hour]
    input[column] = drive.linear_C[before] + sun
    input[column + 1] = drive.linear_C[hour] + sun
  }
}

/** Mean flow into one group from what is stored, all inputs at 0 °C [W]. */
export function storedFlow(element: RunningElement, group: number): number {
  const { modes, state, history, full, size } = element
  if (full) return full.history_W[group] * size
  // Four sums side by side: one alone waits for each addition to end before the next begins.
  let a = 0
  let b = 0
  let c = 0
  let d = 0
  let k = 0
  let at = group * modes
  for (; k + 3 < modes; k += 4, at += 4) {
    a += history[at] * state[k]
    b += history[at + 1] * state[k + 1]
    c += history[at + 2] * state[k + 2]
    d += history[at + 3] * state[k + 3]
  }
  for (; k < modes; k++, at++) a += history[at] * state[k]
  return -(a + b + (c + d))
}

/** Mean flow into one group from modes, outdoor and constant inputs, without the room's part [W]. */
function knownFlow(element: RunningElement, group: number): number {
  const { response, columns, input, outdoor, constant } = element
  let flow = storedFlow(element, group)
  const row = group * columns
  for (let i = 0; i < outdoor.length; i++) {
    const column = outdoor[i].column
    flow += response[row + column] * input[column] + response[row + column + 1] * input[column + 1]
  }
  for (let i = 0; i < constant.length; i++) {
    const column = constant[i].column
    flow += response[row + column] * input[column]
  }
  return flow
}

/** One exact step of all modes. */
function advance(element: RunningElement): void {
  const { modes, columns, state, decay, gain, input } = element
  if (element.full) {
    advanceFull(element, element.full.stepper)
    return
  }
  for (let k = 0; k < modes; k++) state[k] *= decay[k]
  // Four inputs in one pass over the modes: a third less time than mode by mode.
  let j = 0
  for (; j + 3 < columns; j += 4) {
    const [a, b, c, d] = [input[j], input[j + 1], input[j + 2], input[j + 3]]
    const second = (j + 1) * modes
    const third = second + modes
    const fourth = third + modes
    for (let k = 0, at = j * modes; k < modes; k++, at++)
      state[k] += gain[at] * a + gain[second + k] * b + (gain[third + k] * c + gain[fourth + k] * d)
  }
  for (; j < columns; j++) {
    const u = input[j]
    for (let k = 0, at = j * modes; k < modes; k++, at++) state[k] += gain[at] * u
  }
}

function advanceFull(element: RunningElement, stepper: SteppedElement): void {
  const start = new Float64Array(stepper.groups)
  const end = new Float64Array(stepper.groups)
  for (const { group, column } of [...element.room, ...element.constant])
    start[group] = end[group] = element.input[column]
  for (const { group, column } of element.outdoor) {
    start[group] = element.input[column]
    end[group] = element.input[column + 1]
  }
  stepper.finishHour(start, end)
}

/** Whether a plant has to run: sign 1 heats below its set temperature, -1 cools above it. */
function wanted(
  plant: PlantModel | null,
  hourOfDay: number,
  month: number,
  air: number,
  radiant: number,
  sign: number,
): boolean {
  if (!plant) return false
  const set = plant.set_C[hourOfDay]
  if (set === null || !plant.months.includes(month + 1)) return false
  const felt = plant.senses === 'air' ? air : 0.5 * (air + radiant)
  return sign * (set - felt) > 0
}
