import type { Option } from '#contract/option.ts'
import type { Answer } from './answers.ts'
import { listText, monthsText, plural } from './dates.ts'
import type { OptionResult, StateResult } from './option-result.ts'
import type { UnitTexts } from './units.ts'

/** From here on a room is hot for anybody [°C]. */
const HOT_C = 30

/** What can hurt, beside the figure that raises it; the decision is left to local codes and licensed practice. */
export function cautions(result: OptionResult, own: StateResult, option: Option, units: UnitTexts): Answer[] {
  const say = (topic: Answer['topic'], texts: readonly (string | null)[]): Answer[] =>
    texts.filter((text) => text !== null).map((text) => ({ topic, kind: 'caution', text }))
  return [
    ...say('warm', [option.use.people > 0 ? heat(own, units) : null]),
    ...say('damp', [damp(own)]),
    ...say('air', [freshAir(own, option, units), radon(result), stove(result, own)]),
    ...say('building', [soilPressure(option, units), roofLoad(option), nearBerm(option)]),
  ]
}

function heat(own: StateResult, units: UnitTexts): string | null {
  const hot = own.free.measures.extremes.above.find(({ limit_C }) => limit_C === HOT_C)
  if (!hot || hot.hours < 20) return null
  return `Above ${units.temperature(HOT_C)} for ${plural(hot.hours, 'hour')}: heat like this harms children, old and ill people. Look at shade and night air first.`
}

function damp(own: StateResult): string | null {
  const { surfaces } = own.lived.measures.damp
  const worst = surfaces
    .filter(({ part, flaggedClosed }) => part !== 'glass' && flaggedClosed.length > 0)
    .sort((a, b) => Math.max(...b.closed.humidity) - Math.max(...a.closed.humidity))[0]
  const aired = surfaces
    .filter(({ part, flaggedAired }) => part !== 'glass' && flaggedAired.length > 0)
    .sort((a, b) => Math.max(...b.aired.humidity) - Math.max(...a.aired.humidity))[0]
  const parts = [
    worst &&
      `with the windows shut ${place(worst.name)} in ${monthsText(worst.flaggedClosed)} (${percent(Math.max(...worst.closed.humidity))})`,
    aired &&
      `with them open ${place(aired.name)} in ${monthsText(aired.flaggedAired)} (${percent(Math.max(...aired.aired.humidity))})`,
  ].filter((text) => text !== undefined)
  if (parts.length === 0) return null
  return `Damp: monthly mean humidity at a face passes the 80 % of ISO 13788, above which mould may grow: ${parts.join('; ')}.`
}

const place = (name: string) => `at “${name}”`
const percent = (share: number) => `${Math.min(100, Math.round(100 * share))} %`

function freshAir(own: StateResult, option: Option, units: UnitTexts): string | null {
  if (option.use.people === 0) return null
  const { rules, perPerson_Ls } = own.lived.measures.freshAir
  const missed = rules.filter(({ monthsBelow }) => monthsBelow.length > 0)
  if (missed.length === 0) return null
  const least = Math.min(...perPerson_Ls)
  return `Fresh air falls to ${units.airFlow(least)} for each person in a monthly mean, less than ${listText(missed.map(({ source }) => source))} ask${missed.length === 1 ? 's' : ''}. Follow the local code.`
}

function radon(result: OptionResult): string | null {
  if (!result.hasGround) return null
  return 'Rooms on and in the ground can gather radon. Lay the membrane and pipe that your local code asks for, and measure after moving in.'
}

function stove(result: OptionResult, own: StateResult): string | null {
  if (!result.hasHeating || own.lived.measures.heating.year_kWh < 1) return null
  const least = Math.min(...own.lived.measures.freshAir.changes_h)
  if (least > 0.5) return null
  return `A stove in a house with ${least.toFixed(2)} air changes an hour needs combustion air of its own and a carbon monoxide alarm.`
}

function soilPressure(option: Option, units: UnitTexts): string | null {
  const highest = Math.max(0, ...option.sides.map(({ berm }) => berm?.height_m ?? 0))
  if (highest === 0) return null
  const height = units.length(highest)
  return `Soil ${height} high presses on its wall, far more when water stands in it. Wall, drainage and waterproofing are for a licensed engineer and the local code; so is the safety of the dig.`
}

function roofLoad(option: Option): string | null {
  const layers = option.assemblies.find(({ id }) => id === option.roof.assembly)?.layers ?? []
  const heavy =
    option.roof.cover !== undefined || layers.some(({ material }) => material === 'growing_medium')
  if (!heavy) return null
  return 'A roof of wet soil under snow weighs several times as much as a light one. Its structure is for a licensed engineer.'
}

function nearBerm(option: Option): string | null {
  const bermed = option.sides.filter(({ berm }) => berm)
  const open = option.sides.filter(({ openings }) => openings.length > 0)
  if (bermed.length === 0 || open.length > 1) return null
  return 'All openings lie on one side. Ask the local code for a second way out, above all for bedrooms.'
}
