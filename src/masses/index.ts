/** @module Public face of the room of mass definitions: subtracted heavy-quark masses and conversions among them. */
export {
  DEFINITION_NAMES,
  isDefinitionName,
  type DefinitionName,
  type MassDefinition,
  type MassPlace,
} from './definition.js';
export { DEFINITIONS, definitionOf } from './definitions.js';
export type { GivenCoupling, MassConversion, MassRequest } from './request.js';
export { convertMass } from './convert.js';
export { exactMass, type ExactInputs } from './exact.js';
export { ambiguityOverLambda, poleAmbiguity, type PoleAmbiguity, type PoleAmbiguityQuestion } from './ambiguity.js';
export { defaultStrength, poleStrength } from './strength.js';
export { massStudy } from './study.js';
export type * from './study-types.js';
