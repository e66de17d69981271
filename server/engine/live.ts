/** The one door of the engine that forms and drawings use: pure functions, quick enough to follow a moving hand. */
export { airLayerResistance, combinedResistance, uValue } from './conduction/resistance.ts'
export {
  bermFoot,
  buriedThickness,
  floorThickness,
  surfaceHeight,
  totalThickness,
  wallOuterFace,
} from './conduction/section-geometry.ts'
export { atIncidence } from './solar/at-incidence.ts'
export { catalogueGlazing } from './solar/glazing.ts'
export { floorShare, litFloor, type LitFloor } from './solar/lit-floor.ts'
export { profileAngle, shadedHeight, sideAngle, sunlitShare } from './solar/shading.ts'
export { incidenceCosine, sunAt } from './solar/sun.ts'
