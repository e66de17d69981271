import { HOURS } from '#engine/climate/climate-year.ts'
import { SOLAR_CONSTANT_WM2 } from '#engine/climate/solar-day.ts'
import { readTmy3 } from '#engine/climate/tmy3.ts'
import { planeIrradiance } from '#engine/solar/plane.ts'
import { sunOfYear, type SunYear } from '#engine/solar/sun.ts'
import { check, type Check, type CheckGroup } from './check.ts'

const RAD = Math.PI / 180
/** Solar constant behind the columns of the files [W/m²]. */
const FILE_CONSTANT_WM2 = 1367
const STATIONS = ['723650', '725650', '726580', '726930']
const SOURCE =
  'S. Wilcox and W. Marion, Users Manual for TMY3 Data Sets, NREL/TP-581-43156: the station’s file'

/** Our sun against the columns of sun outside the atmosphere in hourly files, which no reader of ours uses. */
export const stationSunChecks: CheckGroup = {
  topic: 'The sun over four stations',
  run: (inputs) => {
    const texts = STATIONS.map((id) => inputs.shared(`climate/tmy3-${id}.csv.gz`))
    if (texts.some((text) => text === null))
      return { leftOut: 'The TMY3 files of the shared folder beside the project are missing.' }
    return texts.flatMap((text, i) => station(STATIONS[i], text!))
  },
}

function station(id: string, text: string): Check[] {
  const climate = readTmy3(text)
  const sun = sunOfYear(climate.place)
  const { level, normal } = outsideColumns(text)
  const scale = FILE_CONSTANT_WM2 / SOLAR_CONSTANT_WM2
  let apart_Wm2 = 0
  let litApart_h = 0
  for (let hour = 0; hour < HOURS; hour++) {
    const full_Wm2 = sun.extraterrestrial_Wm2[hour] * scale
    apart_Wm2 = Math.max(apart_Wm2, Math.abs(full_Wm2 * upright(sun, hour) - level[hour]))
    litApart_h = Math.max(litApart_h, Math.abs(sun.sunlit[hour] - normal[hour] / full_Wm2))
  }
  const ours = sum((hour) => sun.extraterrestrial_Wm2[hour] * scale * upright(sun, hour))
  const flat = planeIrradiance(climate, sun, { tilt_deg: 0, faces_deg: 0 }, Array<number>(12).fill(0.2), [])
  const shared = { source: SOURCE, provenance: 'looked up' } as const
  return [
    check({
      ...shared,
      id: `SOL-14/${id}/hour`,
      title: `Sun outside the atmosphere on the level, ${climate.place.name}: largest deviation of an hour`,
      unit: 'W/m²',
      expected: 0,
      tolerance: 10,
      computed: apart_Wm2,
      note: 'The file has the mean of the hour to the nearest watt, in years of any place in the leap cycle; we take the middle.',
    }),
    check({
      ...shared,
      id: `SOL-14/${id}/year`,
      title: `The same, ${climate.place.name}: whole year over the file’s`,
      unit: '-',
      expected: 1,
      tolerance: 0.005,
      computed: ours / sum((hour) => level[hour]),
      note: 'The middle of an hour stands 0.3 % of the sun’s daily swing above its mean: sin 7.5° over 7.5° is 0.9971.',
    }),
    check({
      ...shared,
      id: `SOL-14/${id}/lit`,
      title: `Sunlit part of an hour, ${climate.place.name}: largest deviation`,
      unit: 'h',
      expected: 0,
      tolerance: 0.05,
      computed: litApart_h,
      note: 'Three minutes: the file’s year is another one of the leap cycle, which moves sunrise by up to two.',
    }),
    check({
      ...shared,
      id: `TRN-09/${id}`,
      title: `Beam and sky on a level plane over the file’s global radiation, whole year, ${climate.place.name}`,
      unit: '-',
      expected: 1,
      tolerance: 0.005,
      computed:
        sum((hour) => flat.beam_Wm2[hour] + flat.sky_Wm2[hour]) / sum((hour) => climate.global_Wm2[hour]),
      note: 'Beam is made from the file’s beam normal to the sun, so that the sum need not close by itself.',
    }),
  ]
}

/** Mean over the whole hour of the sine of altitude, from our position in its sunlit part. */
const upright = (sun: SunYear, hour: number) =>
  sun.sunlit[hour] * Math.max(0, Math.sin(sun.altitude_deg[hour] * RAD))

function sum(value: (hour: number) => number): number {
  let total = 0
  for (let hour = 0; hour < HOURS; hour++) total += value(hour)
  return total
}

/** The file's own radiation outside the atmosphere, on the level and normal to the sun [W/m²]. */
function outsideColumns(text: string): { level: Float64Array; normal: Float64Array } {
  const [, head, ...lines] = text.trim().split(/\r?\n/)
  const names = head.split(',')
  const column = (name: string) => {
    const at = names.findIndex((cell) => cell.startsWith(`${name} (`))
    return Float64Array.from(lines, (line) => Number(line.split(',')[at]))
  }
  return { level: column('ETR'), normal: column('ETRN') }
}
