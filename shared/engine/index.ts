/**
 * The public face of the engine: pure functions, no I/O, clock or randomness; relations are handed in as a registry.
 * A screen that only draws imports from the single files, so that it loads no more than it uses.
 */
export { ENGINE_VERSION } from './version';
export { quickLook } from './quick/quickLook';
export { registryFrom, registryFromJson, isRelationRow } from './relations/registry';
export { allowedArcs, arcsBetween, bindCurve, curve, evaluate, invert, jAt, rootsOf, type Curve, type CurveInputs } from './relations/curve';
export { applies, type Domain } from './relations/applies';
export { substituentsOf, type PathGroups } from './relations/generalised';
export { workedFormula } from './relations/worked';
export { relationRef } from './quick/refs';
export { sectorOf, sectorsOf } from './relations/angles';
export { groupOf, isHydrogen, parseGroup, printGroup, type GroupFault } from './groups/group';
export { GROUP_PRESETS, groupLabel, type GroupPreset } from './groups/presets';
export { comparePriority } from './groups/priority';
export type { Registry } from '../types/relation';
export { caseTrail } from './trail/caseTrail';
export { diffContent, type FieldChange } from './trail/diffContent';
export { canonicalJson } from './trail/canonicalJson';
export { contentFromQuickLook } from './trail/fromQuickLook';
