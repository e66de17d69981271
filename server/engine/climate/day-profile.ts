/**
 * Ratio of hourly to daily global radiation, M. Collares-Pereira and A. Rabl, Solar Energy 22:155-164, 1979:
 *
 *   rt = (π/24) (a + b cos w) (cos w - cos ws) / (sin ws - ws cos ws)
 *   a = 0.409 + 0.5016 sin(ws - 60°),  b = 0.6609 - 0.4767 sin(ws - 60°)
 *
 * (coefficients read in two texts.) 0 outside the day.
 *
 * @param hourAngle_rad w, at the middle of the hour
 * @param sunset_rad    ws, above 0
 */
export function hourShare(hourAngle_rad: number, sunset_rad: number): number {
  const above = Math.cos(hourAngle_rad) - Math.cos(sunset_rad)
  const day = Math.sin(sunset_rad) - sunset_rad * Math.cos(sunset_rad)
  if (above <= 0 || day <= 0) return 0
  const s = Math.sin(sunset_rad - Math.PI / 3)
  const a = 0.409 + 0.5016 * s
  const b = 0.6609 - 0.4767 * s
  return Math.max(0, ((Math.PI / 24) * (a + b * Math.cos(hourAngle_rad)) * above) / day)
}
