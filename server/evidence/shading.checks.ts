import { profileAngle, sunlitShare } from '#engine/solar/shading.ts'
import { check, type Check, type CheckGroup } from './check.ts'

/** Shadow of an endless overhang on an opening. */
export const shadingChecks: CheckGroup = {
  topic: 'Overhangs',
  run: () => [...profiles(), ...shadows()],
}

function profiles(): Check[] {
  const cases: [string, number, number, number][] = [
    ['noon', 26.55, 0, 26.55],
    ['equinox', 32.8, 57.27, 50],
    ['mirrored', 32.8, -57.27, 50],
  ]
  const rows = cases.map(([id, altitude, side, expected]) =>
    check({
      id: `SHD-01/${id}`,
      title: `Profile angle of a sun ${altitude}° high, ${side}° aside, 40° north`,
      source: 'Geometry; at an equinox it is 90° less the latitude all day',
      provenance: 'derived',
      unit: '°',
      expected,
      tolerance: 0.05,
      computed: profileAngle(altitude, side),
    }),
  )
  return [
    ...rows,
    check({
      id: 'SOL-06/profile',
      title: 'Profile angle of Madison, 16 March, 16 h, a wall 25° west of south',
      source: 'Duffie and Beckman, Solar Engineering of Thermal Processes, example 1.6.3',
      provenance: 'from memory',
      unit: '°',
      expected: 25.7,
      tolerance: 0.15,
      computed: profileAngle(19.67, 66.76 - 25),
    }),
  ]
}

function shadows(): Check[] {
  const porch = { depth_m: 0.9, rise_m: 0.3, height_m: 1.5 }
  const box = { depth_m: 1, rise_m: 0.5, height_m: 2 }
  const cases: [string, typeof box, number, number][] = [
    ['SHD-02/summer', porch, 73.45, 1.5],
    ['SHD-02/winter', porch, 26.55, 0.15],
    ['SHD-02/equinox', porch, 50, 0.773],
    ['SHD-03/20', box, 20, 0],
    ['SHD-03/30', box, 30, 0.077],
    ['SHD-03/45', box, 45, 0.5],
    ['SHD-03/60', box, 60, 1.232],
    ['SHD-03/70', box, 70, 2],
  ]
  return cases.map(([id, { depth_m, rise_m, height_m }, profile, expected]) => {
    const opening = {
      width_m: 3,
      height_m,
      overhang: { depth_m, rise_m, extra_m: 1e6 },
      fins: null,
    }
    return check({
      id,
      title: `Shadow on an opening ${height_m} m high under ${depth_m} m, ${rise_m} m above, at ${profile}°`,
      source: id.startsWith('SHD-03')
        ? 'ANSI/ASHRAE Standard 140, case 610: geometry of the overhang'
        : 'Geometry of an endless overhang',
      provenance: 'derived',
      unit: 'm',
      expected,
      tolerance: 0.001,
      computed: height_m * (1 - sunlitShare(opening, profile, 0)),
    })
  })
}
