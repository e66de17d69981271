const RAD = Math.PI / 180

/**
 * Sun of a textbook's example, from its declination and solar time: the reference side of checks on planes and
 * shadows, without refraction. Solar time is within 0 to 24 h.
 */
export function bookSun(
  latitude_deg: number,
  declination_deg: number,
  solar_h: number,
): { readonly altitude_deg: number; readonly azimuth_deg: number } {
  const turn = (solar_h - 12) * 15 * RAD
  const [latitude, declination] = [latitude_deg * RAD, declination_deg * RAD]
  const up =
    Math.sin(latitude) * Math.sin(declination) + Math.cos(latitude) * Math.cos(declination) * Math.cos(turn)
  const north =
    Math.cos(latitude) * Math.sin(declination) - Math.sin(latitude) * Math.cos(declination) * Math.cos(turn)
  const east = -Math.cos(declination) * Math.sin(turn)
  return { altitude_deg: Math.asin(up) / RAD, azimuth_deg: (Math.atan2(east, north) / RAD + 360) % 360 }
}
