/**
 * How quantities are written: SI, or as builders in the United States say them. Rounded to what the
 * model can know. SI needs no conversion; the other way goes through mathjs, which is loaded only then.
 */
export interface UnitTexts {
  readonly system: 'si' | 'us'
  readonly temperature: (value_C: number) => string
  readonly difference: (value_K: number) => string
  /** Bare numbers for tables, with their unit apart. */
  readonly temperatureNumber: (value_C: number) => string
  readonly differenceNumber: (value_K: number) => string
  readonly temperatureUnit: string
  readonly length: (value_m: number) => string
  readonly area: (value_m2: number) => string
  readonly heat: (value_kWh: number) => string
  readonly heatNumber: (value_kWh: number) => string
  readonly heatUnit: string
  readonly power: (value_W: number) => string
  readonly wood: (wood: {
    readonly mass_kg: number
    readonly steres: number
    readonly cords: number
  }) => string
  readonly woodNumber: (wood: { readonly mass_kg: number; readonly cords: number }) => string
  readonly woodUnit: string
  readonly airFlow: (value_Ls: number) => string
  readonly uValue: (value_Wm2K: number) => string
  readonly resistance: (value_m2KW: number) => string
}

/** Whole tens from 20 on, so that nobody takes a sum over the year for a reading; ones below. */
function tens(value: number): string {
  const rounded = Math.abs(value) >= 20 ? Math.round(value / 10) * 10 : Math.round(value)
  return grouped(rounded === 0 ? 0 : rounded)
}

/** Thousands apart by a comma. */
function grouped(value: number): string {
  return String(value).replace(/\B(?=(\d{3})+(?!\d))/g, ',')
}

/** One decimal, and never a minus before nothing. */
function tenth(value: number): string {
  const text = value.toFixed(1)
  return text === '-0.0' ? '0.0' : text
}

const short = (value: number, digits: number) => String(Number(value.toFixed(digits)))

export const siUnits: UnitTexts = {
  system: 'si',
  temperature: (value_C) => `${tenth(value_C)} °C`,
  difference: (value_K) => `${tenth(value_K)} K`,
  temperatureNumber: tenth,
  differenceNumber: tenth,
  temperatureUnit: '°C',
  length: (value_m) => `${short(value_m, 2)} m`,
  area: (value_m2) => `${short(value_m2, 1)} m²`,
  heat: (value_kWh) => `${tens(value_kWh)} kWh`,
  heatNumber: tens,
  heatUnit: 'kWh',
  power: (value_W) => `${grouped(Math.round(value_W / 100) * 100)} W`,
  wood: ({ mass_kg, steres }) => `${tens(mass_kg)} kg of wood (${tenth(steres)} steres)`,
  woodNumber: ({ mass_kg }) => tens(mass_kg),
  woodUnit: 'kg',
  airFlow: (value_Ls) => `${tenth(value_Ls)} L/s`,
  uValue: (value_Wm2K) => `${short(value_Wm2K, 2)} W/(m² K)`,
  resistance: (value_m2KW) => `${short(value_m2KW, 2)} m² K/W`,
}

/** Feet and inches, Fahrenheit, British thermal units, cords. */
export async function usUnits(): Promise<UnitTexts> {
  const { unit } = await import('mathjs')
  const to = (value: number, from: string, wanted: string) => unit(value, from).toNumber(wanted)
  const fahrenheit = (value_C: number) => to(value_C, 'degC', 'degF')
  const degrees = (value_K: number) => to(value_K, 'K', 'degR')
  const millionBtu = (value_kWh: number) => to(value_kWh, 'kWh', 'BTU') / 1e6
  return {
    system: 'us',
    temperature: (value_C) => `${Math.round(fahrenheit(value_C))} °F`,
    difference: (value_K) => `${tenth(degrees(value_K))} °F`,
    temperatureNumber: (value_C) => String(Math.round(fahrenheit(value_C))),
    differenceNumber: (value_K) => tenth(degrees(value_K)),
    temperatureUnit: '°F',
    length: (value_m) => feetAndInches(to(value_m, 'm', 'inch')),
    area: (value_m2) => `${grouped(Math.round(to(value_m2, 'm^2', 'ft^2')))} ft²`,
    heat: (value_kWh) => `${tenth(millionBtu(value_kWh))} million Btu`,
    heatNumber: (value_kWh) => tenth(millionBtu(value_kWh)),
    heatUnit: 'million Btu',
    power: (value_W) => `${grouped(Math.round(to(value_W, 'W', 'BTU/hour') / 100) * 100)} Btu/h`,
    wood: ({ mass_kg, cords }) => `${cordText(cords)} of wood (${tens(to(mass_kg, 'kg', 'lbm'))} lb)`,
    woodNumber: ({ cords }) => cords.toFixed(2),
    woodUnit: 'cords',
    airFlow: (value_Ls) => `${Math.round(to(value_Ls, 'L/s', 'ft^3/minute'))} cfm`,
    uValue: (value_Wm2K) => `U ${short(to(value_Wm2K, 'W/(m^2 K)', 'BTU/(hour ft^2 degR)'), 3)}`,
    resistance: (value_m2KW) => `R ${short(to(value_m2KW, 'm^2 K/W', 'hour ft^2 degR/BTU'), 1)}`,
  }
}

function cordText(cords: number): string {
  const text = cords < 0.1 ? cords.toFixed(2) : cords.toFixed(1)
  return `${text} ${text === '1.0' ? 'cord' : 'cords'}`
}

/** 6'-4 1/2", to the half inch. */
function feetAndInches(inches: number): string {
  const halves = Math.round(Math.abs(inches) * 2)
  const feet = Math.floor(halves / 24)
  const whole = Math.floor((halves % 24) / 2)
  const rest = halves % 2 === 1 ? `${whole === 0 && feet === 0 ? '' : ' '}1/2` : ''
  const left = feet === 0 ? `${whole === 0 && rest ? '' : whole}${rest}"` : `${feet}'-${whole}${rest}"`
  return inches < 0 && halves > 0 ? `-${left}` : left
}
