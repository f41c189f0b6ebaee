import { checkDusk } from './checkDusk';
import { checkRatio } from './checkRatio';
import { checkHighSpeed } from './checkHighSpeed';
import { checkGhost } from './checkGhost';

/** Questions that a photographer asks, with their answers. */
export const checkExamples = [checkDusk, checkRatio, checkHighSpeed, checkGhost] as const;
