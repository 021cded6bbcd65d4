/** @module All mass definitions, one file each, in the order in which they are shown. */
import type { DefinitionName, MassDefinition } from './definition.js';
import { KINETIC } from './definitions/kinetic.js';
import { MSBAR, RUNNING } from './definitions/msbar.js';
import { MSR, MSR_PRACTICAL } from './definitions/msr.js';
import { POLE } from './definitions/pole.js';
import { PS } from './definitions/ps.js';
import { RS, RS_PRIME } from './definitions/rs.js';
import { MRS, PV } from './definitions/summed.js';

const BY_NAME: Readonly<Record<DefinitionName, MassDefinition>> = {
  pole: POLE,
  msbar: MSBAR,
  running: RUNNING,
  rs: RS,
  'rs-prime': RS_PRIME,
  msr: MSR,
  'msr-practical': MSR_PRACTICAL,
  ps: PS,
  mrs: MRS,
  pv: PV,
  kinetic: KINETIC,
};

export const DEFINITIONS: readonly MassDefinition[] = Object.values(BY_NAME);

export const definitionOf = (name: DefinitionName): MassDefinition => BY_NAME[name];
