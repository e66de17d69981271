import { boxChecks } from './box.checks.ts'
import { bridgesChecks } from './bridges.checks.ts'
import { calibrationChecks } from './calibration.checks.ts'
import type { CheckGroup } from './check.ts'
import { climateChecks } from './climate.checks.ts'
import { comfortChecks } from './comfort.checks.ts'
import { glazingChecks } from './glazing.checks.ts'
import { groundChecks } from './ground.checks.ts'
import { groundStandardChecks } from './ground-standard.checks.ts'
import { layersChecks } from './layers.checks.ts'
import { massDepthChecks } from './mass-depth.checks.ts'
import { measuredSoilChecks } from './measured-soil.checks.ts'
import { moistAirChecks } from './moist-air.checks.ts'
import { networkChecks } from './network.checks.ts'
import { reductionChecks } from './reduction.checks.ts'
import { resistanceChecks } from './resistance.checks.ts'
import { shadingChecks } from './shading.checks.ts'
import { slabChecks } from './slab.checks.ts'
import { soilChecks } from './soils.checks.ts'
import { stationSunChecks } from './station-sun.checks.ts'
import { sunChecks } from './sun.checks.ts'
import { tiltedChecks } from './tilted.checks.ts'
import { tradeChecks } from './trade.checks.ts'

/** Every topic of the evidence, in the order in which it is shown. */
export const evidenceGroups: readonly CheckGroup[] = [
  sunChecks,
  stationSunChecks,
  tiltedChecks,
  shadingChecks,
  glazingChecks,
  ...climateChecks,
  resistanceChecks,
  layersChecks,
  slabChecks,
  groundChecks,
  groundStandardChecks,
  bridgesChecks,
  reductionChecks,
  soilChecks,
  measuredSoilChecks,
  massDepthChecks,
  comfortChecks,
  moistAirChecks,
  calibrationChecks,
  networkChecks,
  boxChecks,
  tradeChecks,
]
