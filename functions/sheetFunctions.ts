import { axes } from './sheet/axes.ts';
import { checks } from './sheet/checks.ts';
import { compare } from './sheet/compare.ts';
import { constant } from './sheet/constant.ts';
import { constants } from './sheet/constants.ts';
import { each } from './sheet/each.ts';
import { laws } from './sheet/laws.ts';
import { line } from './sheet/line.ts';
import { next } from './sheet/next.ts';
import { residuals } from './sheet/residuals.ts';
import { share } from './sheet/share.ts';
import { statement } from './sheet/statement.ts';
import { straighten } from './sheet/straighten.ts';
import { straightness } from './sheet/straightness.ts';
import { xAt } from './sheet/xAt.ts';
import { yAt } from './sheet/yAt.ts';
import type { SheetFunction } from './sheetFunction.ts';

/** All sheet functions, in the order in which they are listed. */
export const sheetFunctions: readonly SheetFunction[] = [
  constants,
  constant,
  line,
  straightness,
  compare,
  checks,
  axes,
  residuals,
  yAt,
  xAt,
  statement,
  straighten,
  laws,
  each,
  share,
  next,
];
