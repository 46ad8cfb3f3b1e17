import { incompleteBeta, logBetaKernel, type BetaShape } from './incomplete-beta';
import { incompleteGamma, logGammaKernel, type GammaShape } from './incomplete-gamma';
import { invertTail } from './invert';
import { logGamma } from './stirling';
import type { Side, Tail } from './tail';

/** Below exp(-600) only the leading power of the distribution function is left, and x itself may underflow. */
const FAR = -600;

/** log of the gamma quantile. */
export function logGammaQuantile(caller: string, shape: GammaShape, p: number, side: Side): number {
  const { a } = shape;
  const leading = () => -logGamma(a + 1);
  return invertTail(
    caller,
    {
      start: Math.log(a),
      tail: (v) =>
        v < FAR ? { log: a * v + leading(), side: 'lower' } : incompleteGamma(shape, Math.exp(v)),
      logDensity: (v) => (v < FAR ? a * v + leading() + Math.log(a) : logGammaKernel(shape, Math.exp(v))),
    },
    p,
    side,
  );
}

/** log of the odds x / (1 - x) at the beta quantile x: exact at both ends. */
export function logOddsQuantile(caller: string, shape: BetaShape, p: number, side: Side): number {
  const { a, b, sum, logConstant } = shape;
  const minusLogBeta = () => logConstant + a * Math.log(sum / a) + b * Math.log(sum / b);
  const tail = (v: number): Tail => {
    if (v < FAR) return { log: a * v + minusLogBeta() - Math.log(a), side: 'lower' };
    if (v > -FAR) return { log: -b * v + minusLogBeta() - Math.log(b), side: 'upper' };
    return incompleteBeta(shape, 1 / (1 + Math.exp(-v)), 1 / (1 + Math.exp(v)));
  };
  const logDensity = (v: number) => {
    if (v < FAR) return a * v + minusLogBeta();
    if (v > -FAR) return -b * v + minusLogBeta();
    return logBetaKernel(shape, 1 / (1 + Math.exp(-v)), 1 / (1 + Math.exp(v)));
  };
  return invertTail(caller, { start: Math.log(a / b), tail, logDensity }, p, side);
}
