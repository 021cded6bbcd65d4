/** @module From a setting to its kernel. */
import { borelPadeKernel, type BorelPadeSetting } from './borel-pade.js';
import { contourImprovedKernel, type ContourImprovedSetting } from './contour-improved.js';
import { conformalKernel, type ConformalSetting } from './conformal.js';
import { fixedOrderKernel, type FixedOrderSetting } from './fixed-order.js';
import type { Kernel } from './kernel.js';
import { leastTermKernel, type LeastTermSetting } from './least-term.js';
import { levinKernel, type LevinSetting } from './levin.js';
import { padeKernel, type PadeSetting } from './pade.js';
import { partialPadeKernel, type PartialPadeSetting } from './partial-pade.js';
import { singularityModelKernel, type SingularityModelSetting } from './singularity-model.js';
import { terminantKernel, type TerminantSetting } from './terminant.js';
import { wynnEpsilonKernel, type WynnEpsilonSetting } from './wynn-epsilon.js';

/** A member of a prescription's family, as plain data that can be sent to a worker. */
export type FastSetting =
  | FixedOrderSetting
  | LeastTermSetting
  | TerminantSetting
  | PadeSetting
  | WynnEpsilonSetting
  | LevinSetting
  | BorelPadeSetting
  | PartialPadeSetting
  | ConformalSetting
  | SingularityModelSetting
  | ContourImprovedSetting;

/** Does the kernel take the coefficients of D of a contour quantity, and not those of the fixed-order expansion? */
export const readsCircle = (setting: FastSetting): boolean => setting.kind === 'contour-improved';

export function makeKernel(setting: FastSetting): Kernel {
  switch (setting.kind) {
    case 'fixed-order':
      return fixedOrderKernel(setting);
    case 'least-term':
      return leastTermKernel(setting);
    case 'terminant':
      return terminantKernel(setting);
    case 'pade':
      return padeKernel(setting);
    case 'wynn-epsilon':
      return wynnEpsilonKernel(setting);
    case 'levin':
    case 'weniger-delta':
      return levinKernel(setting);
    case 'borel-pade':
    case 'borel-leroy-pade':
      return borelPadeKernel(setting);
    case 'borel-partial-pade':
      return partialPadeKernel(setting);
    case 'borel-conformal':
      return conformalKernel(setting);
    case 'singularity-model':
      return singularityModelKernel(setting);
    case 'contour-improved':
      return contourImprovedKernel(setting);
  }
}
