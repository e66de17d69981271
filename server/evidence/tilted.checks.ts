import { PEREZ_1990, perezShares } from '#engine/solar/perez.ts'
import { check, type Check, type CheckGroup, type EvidenceInputs } from './check.ts'
import { bookSun } from './parts/book-sun.ts'
import { planeUnder, type OneSun } from './parts/one-sun.ts'

const PAPER = 'R. Perez et al., Solar Energy 44(5), 1990'
const RAD = Math.PI / 180

/** Sun on tilted planes after Perez et al. 1990. */
export const tiltedChecks: CheckGroup = {
  topic: 'Sun on tilted planes',
  run: (inputs) => [coefficients(inputs), ...bookHour(), ...ownSky(), ...identities()],
}

function coefficients(inputs: EvidenceInputs): Check {
  let apart = 0
  inputs.published('perez-coefficients.csv').forEach((row, bin) =>
    ['F11', 'F12', 'F13', 'F21', 'F22', 'F23'].forEach((name, i) => {
      apart = Math.max(apart, Math.abs(Number(row[name]) - PEREZ_1990[bin][i]))
    }),
  )
  return check({
    id: 'TRN-07',
    title: 'Coefficients of the sky: largest deviation of 48 values',
    source: `${PAPER}, table 6`,
    provenance: 'looked up',
    unit: '-',
    expected: 0,
    tolerance: 1e-12,
    computed: apart,
  })
}

/** 40° north, 20 February, 9 to 10 h, 60° to the south; MJ/m² of the hour as W/m². */
function bookHour(): Check[] {
  const W = 1e6 / 3600
  const zenith_deg = 62.2
  const up = Math.cos(zenith_deg * RAD)
  const sky = { diffuse: 0.796 * W, beam: (0.244 / up) * W, outside: (2.335 / up) * W }
  const shares = perezShares(sky.diffuse, sky.beam, sky.outside, zenith_deg, 1 / up)
  const place = bookSun(40, -11.58, 9.5)
  const light = { beam_Wm2: sky.beam, diffuse_Wm2: sky.diffuse, global_Wm2: 1.04 * W }
  const plane = planeUnder({ ...place, ...light, extraterrestrial_Wm2: sky.outside }, 60, 180, 0.6)
  const beamOnly = planeUnder(
    { ...place, ...light, diffuse_Wm2: 0, extraterrestrial_Wm2: sky.outside },
    60,
    180,
    0.6,
  )
  const row = (
    id: string,
    title: string,
    expected: number,
    computed: number,
    example = '2.16.2',
    unit = '-',
  ) =>
    check({
      id: `TRN-${id}`,
      title,
      source: `Duffie and Beckman, Solar Engineering of Thermal Processes, example ${example}`,
      provenance: 'derived',
      unit,
      expected,
      tolerance: 0.005,
      computed,
    })
  return [
    row('05/F1', 'Share from around the sun, book’s hour', 0.2561, shares.circumsolar),
    row('05/F2', 'Share of the horizon band, book’s hour', 0.005, shares.horizon),
    row(
      '02/beam',
      'Beam on a plane at 60°, 40° north, 20 February, 9 to 10 h',
      0.418,
      beamOnly.beam / W,
      '2.15.1',
      'MJ/m²',
    ),
    row(
      '02/ground',
      'Light of the ground on that plane, reflectance 0.6',
      0.156,
      plane.ground / W,
      '2.15.1',
      'MJ/m²',
    ),
    {
      ...row(
        '05/total',
        'All light on that plane, sky after Perez',
        1.371,
        (plane.beam + plane.sky + plane.ground) / W,
        '2.16.2',
        'MJ/m²',
      ),
      note: 'The example takes 1 / cos of the zenith angle for air mass; the program’s, after Kasten and Young, is 0.2 % less there.',
    },
  ]
}

const AZIMUTH_OF_45 = Math.acos(Math.SQRT1_2 / Math.cos(30 * RAD)) / RAD
const SKY: OneSun = {
  altitude_deg: 30,
  azimuth_deg: 180 + AZIMUTH_OF_45,
  beam_Wm2: 600,
  diffuse_Wm2: 200,
  global_Wm2: 500,
  extraterrestrial_Wm2: 1367,
}

function ownSky(): Check[] {
  const shares = perezShares(200, 600, 1367, 60)
  const wall = planeUnder(SKY, 90, 180, 0.2)
  const row = (
    id: string,
    title: string,
    expected: number,
    computed: number,
    tolerance: number,
    unit = '-',
  ) =>
    check({
      id: `TRN-06/${id}`,
      title,
      source: `${PAPER}, equations 1 to 9`,
      provenance: 'derived',
      unit,
      expected,
      tolerance,
      computed,
    })
  return [
    row(
      'F1',
      'Share from around the sun, beam 600, diffuse 200 W/m², zenith 60°',
      0.3795,
      shares.circumsolar,
      1e-4,
    ),
    row('F2', 'Share of the horizon band, same sky', 0.0922, shares.horizon, 1e-4),
    row(
      'diffuse',
      'Diffuse light on an upright plane 45° from the sun, same sky',
      187.845,
      wall.sky + wall.beam - 600 * Math.SQRT1_2,
      0.01,
      'W/m²',
    ),
  ]
}

function identities(): Check[] {
  const flat = planeUnder(SKY, 0, 180, 0.2)
  const leaning = planeUnder(SKY, 60, 180, 0.6)
  const dark = planeUnder({ ...SKY, altitude_deg: -5, beam_Wm2: 0 }, 60, 180, 0)
  const row = (id: string, title: string, expected: number, computed: number) =>
    check({
      id: `TRN-08/${id}`,
      title,
      source: 'Geometry',
      provenance: 'derived',
      unit: 'W/m²',
      expected,
      tolerance: 1e-9,
      computed,
    })
  return [
    row('flat', 'A level plane gets what the horizontal gets', 500, flat.beam + flat.sky + flat.ground),
    row('ground', 'Light of the ground on a plane at 60°, reflectance 0.6', 500 * 0.6 * 0.25, leaning.ground),
    row('even', 'Sky at twilight, even all over, on a plane at 60°', 200 * 0.75, dark.sky),
  ]
}
