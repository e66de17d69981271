/** The parts of the npm package psychrolib (ASHRAE Fundamentals 2017, chapter 1) that the checks use; it ships no types. SI: °C, Pa, J/kg. */
declare module 'psychrolib' {
  interface Psychrometrics {
    readonly SI: number
    SetUnitSystem(system: number): void
    GetSatVapPres(dryBulb_C: number): number
    GetHumRatioFromRelHum(dryBulb_C: number, relativeHumidity: number, pressure_Pa: number): number
    GetHumRatioFromTWetBulb(dryBulb_C: number, wetBulb_C: number, pressure_Pa: number): number
    GetTDewPointFromRelHum(dryBulb_C: number, relativeHumidity: number): number
    GetMoistAirEnthalpy(dryBulb_C: number, humidityRatio: number): number
    GetMoistAirVolume(dryBulb_C: number, humidityRatio: number, pressure_Pa: number): number
    GetMoistAirDensity(dryBulb_C: number, humidityRatio: number, pressure_Pa: number): number
    GetStandardAtmPressure(elevation_m: number): number
  }
  const psychrometrics: Psychrometrics
  export default psychrometrics
}
