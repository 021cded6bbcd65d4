/** @module The options of plot. */
import type { OptionSpec } from './option-kinds.js';

export const PICTURE_OPTIONS = {
  size: {
    kind: 'text',
    placeholder: 'SIZE',
    example: 'column',
    help: 'column (86 mm wide, the default), page (178 mm) or slide (10 by 5.6 inches)',
  },
  as: {
    kind: 'text',
    placeholder: 'FORM',
    example: 'pdf',
    help: 'svg, pdf or png, where the ending of --output does not say it',
  },
  terminal: { kind: 'flag', help: 'draw with characters; the default on a terminal' },
} as const satisfies Readonly<Record<string, OptionSpec>>;

export interface PictureGiven {
  readonly size?: string;
  readonly as?: string;
  readonly terminal?: boolean;
}
