import type { Option } from '../option.ts'
import type { Report } from './check-option.ts'

/** Heating below cooling, comfort from low to high, glass that passes no more than it gives. */
export function checkHabits(option: Option, report: Report): void {
  const { heating, cooling, comfort, glazings } = option
  if (comfort.low_C >= comfort.high_C)
    report(
      ['comfort', 'low_C'],
      `The comfort range begins at ${comfort.low_C} °C and ends at ${comfort.high_C} °C; it must rise.`,
    )
  if (heating && cooling) {
    const months = heating.months.filter((month) => cooling.months.includes(month))
    for (let hour = 0; hour < 24 && months.length > 0; hour++) {
      const warm = atHour(heating.set_C, hour)
      const cool = atHour(cooling.set_C, hour)
      if (warm === null || cool === null || warm <= cool) continue
      report(
        ['heating', 'set_C'],
        `At ${hour}:00 it heats to ${warm} °C while cooling works down to ${cool} °C. Set heating below cooling.`,
      )
      break
    }
  }
  glazings.forEach(({ transmittance, solarFactor, diffuseTransmittance, diffuseSolarFactor }, i) => {
    const angle = transmittance.findIndex((passes, k) => passes > solarFactor[k] + 1e-9)
    if (angle >= 0)
      report(
        ['glazings', i, 'solarFactor', angle],
        `At ${10 * angle}° the glass passes ${transmittance[angle]} of the sun but lets in only ${solarFactor[angle]}; the solar factor contains what is passed.`,
      )
    if (diffuseTransmittance > diffuseSolarFactor + 1e-9)
      report(
        ['glazings', i, 'diffuseSolarFactor'],
        `The glass passes ${diffuseTransmittance} of diffuse sun but lets in only ${diffuseSolarFactor}; the solar factor contains what is passed.`,
      )
  })
}

function atHour<T>(value: T | readonly T[], hour: number): T {
  return Array.isArray(value) ? (value as readonly T[])[hour] : (value as T)
}
