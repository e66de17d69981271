import type { Option } from '#contract/option.ts'
import type { SoilState } from '#contract/soil.ts'
import { cautions } from './cautions.ts'
import { dayText, listText, monthsText, plural } from './dates.ts'
import type { OptionResult, RunResult, StateResult } from './option-result.ts'
import type { UnitTexts } from './units.ts'

/** A yearly wave smaller than this has no day that is warmest [K]. */
const STILL_K = 0.3

/** One sentence about a house. */
export interface Answer {
  readonly topic:
    'cold' | 'warm' | 'swing' | 'fire' | 'berm' | 'carry-over' | 'first years' | 'damp' | 'air' | 'building'
  /** A caution stands beside the figure that raises it. */
  readonly kind: 'answer' | 'caution'
  readonly text: string
}

/** What a result says, in plain words: answers first, cautions after the answers of their topic. */
export function answers(result: OptionResult, option: Option, units: UnitTexts): Answer[] {
  const own = result.states.find(({ state }) => state === result.guess) ?? result.states[0]
  const say = (topic: Answer['topic'], texts: readonly (string | null)[]): Answer[] =>
    texts.filter((text) => text !== null).map((text) => ({ topic, kind: 'answer', text }))
  return [
    ...say('cold', [coldest(result, own, units), coldDays(result, own, units)]),
    ...say('warm', [warmest(own, units), warmDays(own, units)]),
    ...say('swing', [swing(own, units)]),
    ...say('fire', [fire(result, own, units), fireLimit(result, own, units)]),
    ...say('berm', bermLag(own, units)),
    ...say('carry-over', [carryOver(own, units)]),
    ...say('first years', [firstYears(result, own, units)]),
    ...cautions(result, own, option, units),
  ]
}

/** Without a fire the room falls to 12.9 °C on the coldest night (20 January), 11.4 °C if the soil is wet. */
function coldest(result: OptionResult, own: StateResult, units: UnitTexts): string {
  const { coldest } = own.free.measures.extremes
  const head = result.hasHeating ? 'Without a fire the room' : 'The room'
  const others = differing(
    result,
    own,
    (run) => run.measures.extremes.coldest.temperature_C,
    units.temperature,
  )
  return `${head} falls to ${units.temperature(coldest.temperature_C)} on the coldest night (${dayText(coldest)})${tail(others)}.`
}

/** The same figure in the other soil states, where it reads differently. */
function differing(
  result: OptionResult,
  own: StateResult,
  value: (run: RunResult) => number,
  text: (value: number) => string,
  run: 'free' | 'lived' = 'free',
): { readonly state: SoilState; readonly text: string }[] {
  const mine = text(value(own[run]))
  return result.states
    .filter(({ state }) => state !== own.state)
    .map((one) => ({ state: one.state, text: text(value(one[run])) }))
    .filter((one) => one.text !== mine)
}

/** 11.4 °C if the soil is damp or wet; states that read alike are named together. */
function tail(others: readonly { readonly state: SoilState; readonly text: string }[]): string {
  const texts = [...new Set(others.map(({ text }) => text))].map((text, i) => {
    const states = others.filter((one) => one.text === text).map(({ state }) => state)
    return `${text} if ${i === 0 ? 'the soil' : 'it'} is ${states.join(' or ')}`
  })
  return texts.length === 0 ? '' : `, ${listText(texts)}`
}

function coldDays(result: OptionResult, own: StateResult, units: UnitTexts): string | null {
  const [below] = own.free.measures.extremes.below
  if (below.hours === 0) return null
  const head = result.hasHeating ? 'Without a fire it' : 'It'
  const row = below.days > 1 ? `, ${below.daysInARow} of them in a row` : ''
  return `${head} is colder than ${units.temperature(below.limit_C)} at some hour of ${plural(below.days, 'day')} in a year${row}.`
}

function warmest(own: StateResult, units: UnitTexts): string {
  const { warmest } = own.free.measures.extremes
  return `The warmest hour has ${units.temperature(warmest.temperature_C)} (${dayText(warmest)}).`
}

function warmDays(own: StateResult, units: UnitTexts): string | null {
  const [above] = own.free.measures.extremes.above
  if (above.hours === 0) return null
  const most = Math.max(...above.month_h)
  const months = above.month_h.flatMap((hours, m) => (hours > 0.5 * most ? [m + 1] : []))
  return `It is warmer than ${units.temperature(above.limit_C)} in ${plural(above.hours, 'hour')} on ${plural(above.days, 'day')}, most of all in ${monthsText(months)}.`
}

function swing(own: StateResult, units: UnitTexts): string {
  const { year_K, largest } = own.free.measures.swing
  return `From its lowest to its highest a day moves by ${units.difference(year_K)} on average, at most by ${units.difference(largest.swing_K)} (${dayText(largest)}).`
}

function fire(result: OptionResult, own: StateResult, units: UnitTexts): string | null {
  if (!result.hasHeating) return null
  const { heating } = own.lived.measures
  if (heating.year_kWh < 1) return 'The fire asked for is never needed.'
  const months = heating.month_kWh.flatMap((heat, m) => (heat >= 0.02 * heating.year_kWh ? [m + 1] : []))
  const others = differing(result, own, (run) => run.measures.heating.year_kWh, units.heat, 'lived')
  return `To hold the warmth asked for takes ${units.heat(heating.year_kWh)} a year in ${monthsText(months)}, about ${units.wood(heating.firewood)}${others.length > 0 ? `; it takes${tail(others).slice(1)}` : ''}.`
}

function fireLimit(result: OptionResult, own: StateResult, units: UnitTexts): string | null {
  const hours = own.lived.heatingAtLimit_h
  if (!result.hasHeating || hours < 1) return null
  const { coldest } = own.lived.measures.extremes
  return `The heater runs at its limit for ${plural(hours, 'hour')}; with it the coldest hour has ${units.temperature(coldest.temperature_C)}.`
}

/** The berm 2 m from the wall is warmest about 2 October, 71 days after the outdoor air. */
function bermLag(own: StateResult, units: UnitTexts): string[] {
  const places = [
    { probe: ': berm, 2 m from the wall', place: `The berm ${units.length(2)} from the wall` },
    { probe: ': 3 m below the floor', place: `The soil ${units.length(3)} below the floor` },
  ]
  return places.flatMap(({ probe, place }) => {
    // The first bermed side's, or the first side's: the others read alike.
    const line = own.free.measures.lags.find(({ kind, name }) => kind === 'probe' && name.endsWith(probe))
    if (!line) return []
    const { amplitude, behindAir_d, damping, warmest, mean } = line
    if (amplitude < STILL_K) return [`${place} stays near ${units.temperature(mean)} all year.`]
    const days = plural(Math.round(Math.abs(behindAir_d)), 'day')
    const late = behindAir_d >= 0 ? 'after' : 'before'
    return [
      `${place} is warmest about ${dayText(warmest)}, ${days} ${late} the outdoor air, and moves ${Math.round(100 * damping)} % as far through the year.`,
    ]
  })
}

function carryOver(own: StateResult, units: UnitTexts): string | null {
  const carried = own.free.measures.carryOver
  if (!carried || carried.held_kWh < 1) return null
  const { peak, trough, held_kWh, returned_kWh, firewood } = carried
  const held = `Ground and mass hold ${units.heat(held_kWh)} more at their fullest (${dayText(peak)}) than at their emptiest (${dayText(trough)}).`
  const back =
    returned_kWh > 1
      ? `Between those days ${units.heat(returned_kWh)} came back into the room, as much as ${units.wood(firewood.returned)}.`
      : `Between those days the room still gave them ${units.heat(-returned_kWh)} more than it got.`
  return `${held} ${back}`
}

function firstYears(result: OptionResult, own: StateResult, units: UnitTexts): string | null {
  const { charging } = own.free
  if (charging.length === 0 || !result.charging) return null
  const cold = charging.map(
    ({ extremes }, i) => `${units.temperature(extremes.coldest.temperature_C)} in year ${i + 1}`,
  )
  const later = units.temperature(own.free.measures.extremes.coldest.temperature_C)
  const head = `Finished at the start of ${monthsText([result.charging.month])}, the coldest hour without a fire has ${listText(cold)}, and ${later} once the ground is charged.`
  if (!result.hasHeating) return head
  const wood = own.lived.charging.map(({ heating }, i) => `${units.heat(heating.year_kWh)} in year ${i + 1}`)
  return `${head} Backup heat takes ${listText(wood)}, and ${units.heat(own.lived.measures.heating.year_kWh)} later.`
}
