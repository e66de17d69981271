/** One layer of one material, uniform. */
export interface Layer {
  readonly name: string
  readonly thickness_m: number
  readonly conductivity_WmK: number
  /** Density times specific heat [J/(m³ K)], more than 0: give a massless layer that of air, 1200. */
  readonly volumetricHeat_Jm3K: number
}

/** Soil, footing or board, with no thickness of its own. */
export type Substance = Omit<Layer, 'thickness_m'>

/** Plane layers from outside to inside. Boundary groups: `outside`, `inside`. */
export interface LayersSpec {
  readonly kind: 'layers'
  /** From outside to inside. */
  readonly layers: readonly Layer[]
  /** Combined film outside [W/(m² K)]; 0 makes the outside adiabatic and leaves its group out. */
  readonly outsideFilm_Wm2K: number
  /** Combined film inside [W/(m² K)]. */
  readonly insideFilm_Wm2K: number
}

/** One well-mixed body, for example water containers. Boundary group: `inside`. */
export interface LumpedSpec {
  readonly kind: 'lumped'
  readonly capacity_JK: number
  /** Surface times combined film [W/K]. */
  readonly conductance_WK: number
}

/**
 * A vertical half-section through floor, wall and ground, for 1 m of wall length.
 *
 * x runs outwards from the middle of the floor (x = 0, adiabatic), the wall stands from
 * `halfFloor_m` outwards. z runs upwards, z = 0 is the level ground outside.
 * Boundary groups, in this order: `floor`, `wall-inside`, `wall-outside` (the modelled wall above the
 * soil; left out when there is none), `level` (level ground and berm crest), `slope` (berm slope; only
 * with a berm). The top of the wall, the far end and the bottom are adiabatic.
 */
export interface SectionSpec {
  readonly kind: 'section'
  readonly halfFloor_m: number
  /** Upper face of the floor above level ground, negative when dug in. */
  readonly floorLevel_m: number
  /** From below to the room. */
  readonly floor: readonly Layer[]
  /** From outside to inside. */
  readonly wall: readonly Layer[]
  /** Top of the modelled part of the wall above level ground; above the soil outside and above the floor. */
  readonly wallTop_m: number
  /** Under the wall, as wide as the wall, down to this depth below level ground (below the floor layers). */
  readonly footing: { readonly depth_m: number; readonly substance: Substance } | null
  /** Natural ground. */
  readonly soil: Substance
  readonly berm: {
    /** Crest above level ground. */
    readonly height_m: number
    /** Level top of the berm, from the wall's outer face outwards. */
    readonly crest_m: number
    /** Horizontal run for each metre of rise. */
    readonly run: number
    readonly soil: Substance
  } | null
  /** Layers on top of berm and ground from the wall's outer face outwards, from the surface downwards; thickness across the layer. */
  readonly cover: { readonly layers: readonly Layer[]; readonly reach_m: number } | null
  /** Buried insulating layers directly under the cover, from above downwards; reach measured horizontally from the wall's outer face. */
  readonly umbrella: { readonly layers: readonly Layer[]; readonly reach_m: number } | null
  /** Vertical insulation against the wall's and footing's outer face. top and bottom are z, below the surface. */
  readonly skirt: {
    readonly substance: Substance
    readonly thickness_m: number
    readonly top_m: number
    readonly bottom_m: number
  } | null
  /** Combined films [W/(m² K)]. */
  readonly films: {
    readonly floor: number
    readonly wallInside: number
    readonly wallOutside: number
    readonly ground: number
  }
  /** How far the mesh goes: below level ground, and beyond the umbrella, the cover or the toe of the berm. */
  readonly extent: { readonly depth_m: number; readonly beyond_m: number }
  /** 1 is the usual mesh; 2 halves every cell both ways. */
  readonly refinement: number
  /** Temperatures to follow, x from the wall's outer face outwards, depth below the surface there (negative x: below the floor, depth below its upper face). */
  readonly probes: readonly { readonly name: string; readonly fromWall_m: number; readonly depth_m: number }[]
}

export type ElementSpec = LayersSpec | LumpedSpec | SectionSpec
