/** |z|, |z'| and |zeta|: up to 2 no signal, below 3 a warning signal, from 3 an action signal. */
export const WARNING_LIMIT = 2;
export const ACTION_LIMIT = 3;
/** |E_n| above 1 is an action signal. */
export const E_N_LIMIT = 1;
/** |P_A| above 100 percent of the allowed difference is an action signal. */
export const ALLOWED_PERCENT = 100;

export type ScoreKind = 'z' | 'z-prime' | 'zeta' | 'e-n' | 'p-a';
export type Signal = 'none' | 'warning' | 'action';
