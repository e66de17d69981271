import type { Option } from '#contract/option.ts'
import type { SoilState } from '#contract/soil.ts'
import { cautions } from './cautions.ts'
import { dayText, listText, monthsText } from './dates.ts'
import type { OptionResult, RunResult, StateResult } from './option-result.ts'
import type { UnitTexts } from './units.ts'

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
    ...say('cold', [coldest(result, own, units), coldDays(result, own)]),
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
  const soil = result.hasGround ? ` with ${own.state} soil` : ''
  const lead = others.length > 0 ? soil : ''
  return `${head} falls to ${units.temperature(coldest.temperature_C)} on the coldest night (${dayText(coldest)})${lead}${tail(others)}.`
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

function tail(others: readonly { readonly state: SoilState; readonly text: string }[]): string {
  return others.length === 0
    ? ''
    : `, ${listText(others.map(({ state, text }) => `${text} if it is ${state}`))}`
}

function coldDays(result: OptionResult, own: StateResult): string | null {
  const [below] = own.free.measures.extremes.below
  const head = result.hasHeating ? 'Without a fire it' : 'It'
  if (below.hours === 0) return null
  return `${head} is colder than ${below.limit_C} °C at some hour of ${plural(below.days, 'day')} in a year, ${plural(below.daysInARow, 'day')} of them in a row.`
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
  return `To hold the warmth asked for takes ${units.heat(heating.year_kWh)} a year${tail(others)}; with ${own.state} soil about ${units.wood(heating.firewood)}, burnt in ${monthsText(months)}.`.replace(
    result.hasGround ? '' : ` with ${own.state} soil`,
    '',
  )
}

function fireLimit(result: OptionResult, own: StateResult, units: UnitTexts): string | null {
  const hours = own.lived.heatingAtLimit_h
  if (!result.hasHeating || hours < 1) return null
  const { coldest } = own.lived.measures.extremes
  return `The heater runs at its limit for ${plural(hours, 'hour')}; with it the coldest hour has ${units.temperature(coldest.temperature_C)}.`
}

/** The berm 2 m from the wall is warmest on 2 October, 71 days after the air. */
function bermLag(own: StateResult, units: UnitTexts): (string | null)[] {
  const { lags } = own.free.measures
  const air = lags.find(({ kind }) => kind === 'outdoor')
  const wanted = /: (berm, [\d.]+ m from the wall|3 m below the floor)$/
  const seen = new Set<string>()
  const lines = lags.filter(({ kind, name }) => {
    const place = wanted.exec(name)?.[1]
    if (kind !== 'probe' || place === undefined || seen.has(place)) return false
    seen.add(place)
    return true
  })
  const told = lines.filter(({ name }) => /berm, 2 m|below the floor/.test(name))
  if (!air) return []
  return told.map(({ name, amplitude, behindAir_d, damping, warmest, mean }) => {
    const place = wanted.exec(name)![1].replace('berm, ', 'The berm ').replace(/^3 m/, 'The soil 3 m')
    const days = Math.round(Math.abs(behindAir_d))
    const late = behindAir_d >= 0 ? 'after' : 'before'
    if (amplitude < 0.3) return `${place} stays near ${units.temperature(mean)} all year.`
    return `${place} is warmest about ${dayText(warmest)}, ${plural(days, 'day')} ${late} the outdoor air, and moves ${Math.round(100 * damping)} % as far through the year.`
  })
}

function carryOver(own: StateResult, units: UnitTexts): string | null {
  const carried = own.free.measures.carryOver
  if (!carried || carried.held_kWh < 1) return null
  const { peak, trough, held_kWh, returned_kWh, firewood } = carried
  const back =
    returned_kWh > 1
      ? `${units.heat(returned_kWh)} of it came back into the room between those days, as much as ${units.wood(firewood.returned)}`
      : 'none of it came back into the room: the room fed the ground all winter'
  return `Ground and mass hold ${units.heat(held_kWh)} more at their fullest (${dayText(peak)}) than at their emptiest (${dayText(trough)}); without a fire ${back}.`
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

export function plural(count: number, word: string): string {
  return `${String(count).replace(/\B(?=(\d{3})+(?!\d))/g, ',')} ${word}${count === 1 ? '' : 's'}`
}
