import { HOUR_S, HOURS } from '../climate/climate-year.ts'
import type { YearTrace } from '../year/year-trace.ts'
import { J_PER_KWH, MONTH_OF_HOUR, before, sum } from './months.ts'

export type LedgerKind =
  | 'sun'
  | 'gains'
  | 'heating'
  | 'cooling'
  | 'windows'
  | 'infiltration'
  | 'ventilation'
  | 'flush'
  | 'surface'
  | 'outside'
  | 'stored'

/** One flow or one store, by month (12 values) and for the year [kWh]. */
export interface LedgerLine {
  readonly name: string
  readonly kind: LedgerKind
  readonly month_kWh: number[]
  readonly year_kWh: number
}

/** What enters minus what leaves is what is stored. */
export interface Ledger {
  /** Positive inwards. */
  readonly flows: LedgerLine[]
  /** Growth of what is stored. */
  readonly stored: LedgerLine[]
  /** Flows minus growth; nothing when the ledger adds up. */
  readonly residual: { readonly month_kWh: number[]; readonly year_kWh: number }
  /** Sum of the absolute flows of all hours [kWh]. */
  readonly throughput_kWh: number
  /** Sum of the absolute residuals of all hours over the throughput, so that errors cannot cancel. */
  readonly residualShare: number
}

export interface YearLedger {
  /** Around the air of the room: every face counts as a flow. */
  readonly room: Ledger
  /** Around room, mass and modelled ground: only what passes outdoors counts as a flow. */
  readonly house: Ledger
  /** Around each element: its faces in the room and its outdoor side. */
  readonly elements: { readonly element: string; readonly ledger: Ledger }[]
}

interface Flow {
  readonly name: string
  readonly kind: LedgerKind
  readonly flow_W: Float64Array
  /** -1 for a series that is positive outwards. */
  readonly sign: 1 | -1
}

interface Store {
  readonly name: string
  /** At the end of each hour, and at the start of the first [J]. */
  readonly held_J: Float64Array
  readonly start_J: number
}

/** Ledgers of the room, of the whole house and of each element, from the trace alone. */
export function ledger(trace: YearTrace): YearLedger {
  const into = (name: string, kind: LedgerKind, flow_W: Float64Array): Flow => ({
    name,
    kind,
    flow_W,
    sign: 1,
  })
  const outOf = (name: string, kind: LedgerKind, flow_W: Float64Array): Flow => ({
    name,
    kind,
    flow_W,
    sign: -1,
  })
  const airFlows = [
    into('sun', 'sun', trace.solar_W),
    into('gains', 'gains', trace.gains_W),
    into('heating', 'heating', trace.heating_W),
    outOf('cooling', 'cooling', trace.cooling_W),
    into('windows and doors', 'windows', trace.windows_W),
    into('infiltration', 'infiltration', trace.infiltration_W),
    into('ventilation', 'ventilation', trace.ventilation_W),
    into('flush', 'flush', trace.flush_W),
  ]
  const air: Store = {
    name: 'air and furniture',
    held_J: trace.air_C.map((air_C) => air_C * trace.airCapacity_JK),
    start_J: trace.startAir_C * trace.airCapacity_JK,
  }
  const storeOf = (element: YearTrace['elements'][number]): Store => ({
    name: element.name,
    held_J: element.stored_J,
    start_J: element.startStored_J,
  })
  const outside = trace.elements.map((element) => into(element.name, 'outside', element.outside_W))
  const surfaces = trace.surfaces.map((surface) => outOf(surface.name, 'surface', surface.flow_W))
  const { firstHour } = trace
  return {
    room: addUp([...airFlows, ...surfaces], [air], firstHour),
    house: addUp([...airFlows, ...outside], [air, ...trace.elements.map(storeOf)], firstHour),
    elements: trace.elements.map((element, i) => {
      const faces = trace.surfaces.filter((surface) => surface.element === element.name)
      const flows = [...faces.map((face) => into(face.name, 'surface', face.flow_W)), outside[i]]
      return { element: element.name, ledger: addUp(flows, [storeOf(element)], firstHour) }
    }),
  }
}

function addUp(flows: readonly Flow[], stores: readonly Store[], firstHour: number): Ledger {
  const residual_J = new Float64Array(HOURS)
  let throughput_J = 0
  const line = (name: string, kind: LedgerKind, hour_J: (hour: number) => number): LedgerLine => {
    const month_kWh = new Array<number>(12).fill(0)
    for (let hour = 0; hour < HOURS; hour++) month_kWh[MONTH_OF_HOUR[hour]] += hour_J(hour) / J_PER_KWH
    return { name, kind, month_kWh, year_kWh: sum(month_kWh) }
  }
  const flowLines = flows.map(({ name, kind, flow_W, sign }) =>
    line(name, kind, (hour) => {
      const heat_J = sign * flow_W[hour] * HOUR_S
      residual_J[hour] += heat_J
      throughput_J += Math.abs(heat_J)
      return heat_J
    }),
  )
  const storeLines = stores.map(({ name, held_J, start_J }) =>
    line(name, 'stored', (hour) => {
      const earlier = before(hour, firstHour, HOURS)
      const growth_J = held_J[hour] - (earlier < 0 ? start_J : held_J[earlier])
      residual_J[hour] -= growth_J
      return growth_J
    }),
  )
  const residual = line('residual', 'stored', (hour) => residual_J[hour])
  const absolute_J = residual_J.reduce((total, value) => total + Math.abs(value), 0)
  return {
    flows: flowLines,
    stored: storeLines,
    residual: { month_kWh: residual.month_kWh, year_kWh: residual.year_kWh },
    throughput_kWh: throughput_J / J_PER_KWH,
    residualShare: throughput_J > 0 ? absolute_J / throughput_J : absolute_J > 0 ? 1 : 0,
  }
}
