import { HOUR_S } from '../climate/climate-year.ts'
import type { YearTrace } from '../year/year-trace.ts'
import { firewood, type Firewood, type Fuel } from './firewood.ts'
import { DAYS, J_PER_KWH, MONTH_OF_HOUR, dailyMeans, dateOfDay, sum, type DayDate } from './months.ts'

/** How an element takes part in the carry-over. */
export type StoreRole = 'ground' | 'mass' | 'shell'

/** A part that holds heat. */
export interface HeldHeat {
  /** Element, with the part of the section where one is meant. */
  readonly name: string
  readonly element: string
  readonly role: StoreRole
  /** At the peak of the whole store minus at its trough, so that the parts add up [kWh]. */
  readonly held_kWh: number
  /** The part's own highest and lowest day, and what lies between [kWh]. */
  readonly own: { readonly peak: DayDate; readonly trough: DayDate; readonly swing_kWh: number }
}

/**
 * Heat through one face of the room, whole days' sums, so that what goes in by day and comes out at
 * night is left out. 12 monthly values each.
 */
export interface FaceExchange {
  readonly name: string
  readonly element: string
  readonly role: StoreRole
  /** Days on which it took more than it gave. */
  readonly putIn_kWh: number[]
  /** Days on which it gave more than it took, positive. */
  readonly cameBack_kWh: number[]
  /** Into the face: from the trough to the peak of the store, and from the peak to the trough (negative: it gave). */
  readonly charging_kWh: number
  readonly returning_kWh: number
  /** Into the face over the whole year. */
  readonly net_kWh: number
}

export interface CarryOver {
  readonly peak: DayDate
  readonly trough: DayDate
  /** Held at the peak above the trough by ground and interior mass. */
  readonly held_kWh: number
  /** Held above the trough by day of the year, 365 values. */
  readonly day_kWh: number[]
  readonly stores: HeldHeat[]
  readonly faces: FaceExchange[]
  /** Through the faces of ground and interior mass, over the year, warm and cold spells included. */
  readonly putIn_kWh: number
  readonly cameBack_kWh: number
  /** Net through the same faces from the trough to the peak, into them. */
  readonly charged_kWh: number
  /** Net through the same faces from the peak to the trough, out of them; negative where the room fed the ground all winter. */
  readonly returned_kWh: number
  /** From ground and interior mass to the outdoors and the deep ground, over the year: put in, not come back, and not kept. */
  readonly leaked_kWh: number
  /** What ground and interior mass hold more at the year's end than at its start; nothing in the repeating year. */
  readonly kept_kWh: number
  readonly firewood: { readonly held: Firewood; readonly cameBack: Firewood; readonly returned: Firewood }
}

export interface CarryOverSettings {
  /** Length of each section [m], by the element's name. */
  readonly length_m: Readonly<Record<string, number>>
  /** Layered elements that pass heat outdoors: they are shown but not counted, since what they give back came through them. */
  readonly shell: ReadonlySet<string>
  readonly fuel: Fuel
  readonly stoveEfficiency: number
}

/**
 * Carry-over: heat that ground and interior mass hold at the year's highest day above its lowest, when
 * it went in, through which face it came back, and how much leaked away.
 *
 * Held heat is the daily mean. For a section it is what its heat probes say (`heat:…`, J per metre of
 * length, parts that do not overlap: the ground near the house and not the far field), or the whole
 * section where there are none; for layers and water it is all that they store.
 * Soil near the surface warms in summer without any help of the house, and that is in the held heat
 * too: what the house had of it is `returned_kWh`, the net through its faces from peak to trough.
 *
 * @returns null for a house that has neither ground sections nor interior mass
 * @throws RangeError for a section with heat probes whose length is not given
 */
export function carryOver(trace: YearTrace, settings: CarryOverSettings): CarryOver | null {
  const role = new Map<string, StoreRole>(
    trace.elements.map((element) => [
      element.name,
      element.kind === 'section' ? 'ground' : settings.shell.has(element.name) ? 'shell' : 'mass',
    ]),
  )
  const counts = (element: string) => role.get(element) !== 'shell'
  const stores = heldSeries(trace, settings.length_m)
  const total = new Float64Array(DAYS)
  for (const store of stores)
    if (counts(store.element)) for (let day = 0; day < DAYS; day++) total[day] += store.day_J[day]
  if (!stores.some((store) => counts(store.element))) return null

  const { peak, trough } = highestAndLowest(total)
  const faces = trace.surfaces.map((surface) =>
    faceExchange(surface.name, surface.element, role.get(surface.element)!, surface.flow_W, trough, peak),
  )
  const counted = faces.filter((face) => counts(face.element))
  const putIn_kWh = sum(counted.map((face) => sum(face.putIn_kWh)))
  const cameBack_kWh = sum(counted.map((face) => sum(face.cameBack_kWh)))
  const charged_kWh = sum(counted.map((face) => face.charging_kWh))
  const returned_kWh = 0 - sum(counted.map((face) => face.returning_kWh))
  const held_kWh = (total[peak] - total[trough]) / J_PER_KWH
  let leaked_J = 0
  let kept_J = 0
  for (const element of trace.elements) {
    if (!counts(element.name)) continue
    leaked_J -= sum(element.outside_W) * HOUR_S
    kept_J += element.stored_J[(trace.firstHour + 8759) % 8760] - element.startStored_J
  }
  const wood = (heat_kWh: number) => firewood(heat_kWh, settings.fuel, settings.stoveEfficiency)
  return {
    peak: dateOfDay(peak),
    trough: dateOfDay(trough),
    held_kWh,
    day_kWh: Array.from(total, (held_J) => (held_J - total[trough]) / J_PER_KWH),
    stores: stores.map(({ name, element, day_J }) => {
      const own = highestAndLowest(day_J)
      return {
        name,
        element,
        role: role.get(element)!,
        held_kWh: (day_J[peak] - day_J[trough]) / J_PER_KWH,
        own: {
          peak: dateOfDay(own.peak),
          trough: dateOfDay(own.trough),
          swing_kWh: (day_J[own.peak] - day_J[own.trough]) / J_PER_KWH,
        },
      }
    }),
    faces,
    putIn_kWh,
    cameBack_kWh,
    charged_kWh,
    returned_kWh,
    leaked_kWh: leaked_J / J_PER_KWH,
    kept_kWh: kept_J / J_PER_KWH,
    firewood: {
      held: wood(held_kWh),
      cameBack: wood(cameBack_kWh),
      returned: wood(Math.max(0, returned_kWh)),
    },
  }
}

function heldSeries(trace: YearTrace, length_m: CarryOverSettings['length_m']) {
  return trace.elements.flatMap((element) => {
    const probes =
      element.kind === 'section'
        ? trace.probes.filter((probe) => probe.element === element.name && probe.name.startsWith('heat:'))
        : []
    if (probes.length === 0)
      return [{ name: element.name, element: element.name, day_J: dailyMeans(element.stored_J) }]
    const length = length_m[element.name]
    if (!(length > 0)) throw new RangeError(`carry-over: the length of section "${element.name}" is missing`)
    return probes.map((probe) => ({
      name: `${element.name}: ${probe.name.slice('heat:'.length)}`,
      element: element.name,
      day_J: dailyMeans(probe.value).map((heat_Jm) => heat_Jm * length),
    }))
  })
}

function highestAndLowest(day_J: Float64Array): { peak: number; trough: number } {
  let peak = 0
  let trough = 0
  for (let day = 1; day < DAYS; day++) {
    if (day_J[day] > day_J[peak]) peak = day
    if (day_J[day] < day_J[trough]) trough = day
  }
  return { peak, trough }
}

function faceExchange(
  name: string,
  element: string,
  role: StoreRole,
  flow_W: Float64Array,
  trough: number,
  peak: number,
): FaceExchange {
  const putIn_kWh = new Array<number>(12).fill(0)
  const cameBack_kWh = new Array<number>(12).fill(0)
  let charging_kWh = 0
  let returning_kWh = 0
  const daily = dailyMeans(flow_W)
  for (let day = 0; day < DAYS; day++) {
    const heat_kWh = (daily[day] * 24) / 1000
    const month = MONTH_OF_HOUR[day * 24]
    if (heat_kWh > 0) putIn_kWh[month] += heat_kWh
    else cameBack_kWh[month] -= heat_kWh
    // Days on the way round the year from the trough up to the peak.
    const isCharging = trough < peak ? day > trough && day <= peak : day > trough || day <= peak
    if (isCharging) charging_kWh += heat_kWh
    else returning_kWh += heat_kWh
  }
  return {
    name,
    element,
    role,
    putIn_kWh,
    cameBack_kWh,
    charging_kWh,
    returning_kWh,
    net_kWh: charging_kWh + returning_kWh,
  }
}
