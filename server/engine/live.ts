/** The one door of the engine that forms and drawings use: pure functions, quick enough to follow a moving hand. */
export { airLayerResistance, combinedResistance, uValue } from './conduction/resistance.ts'
