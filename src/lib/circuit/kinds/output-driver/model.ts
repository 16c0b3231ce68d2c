import { add, multiply, type Polynomial } from "../../network/polynomial.ts";
import { cascade, type Transfer } from "../../network/transfer.ts";

/** 1/A(s) of the op amp, constant term first; zeros for an ideal one. */
export interface OpAmp {
  gainBandwidth: number | null;
  openLoopGain: number | null;
}

function sigmaOf({ gainBandwidth, openLoopGain }: OpAmp): Polynomial {
  if (gainBandwidth === null) return [0];
  return [openLoopGain === null ? 0 : 1 / openLoopGain, 1 / (2 * Math.PI * gainBandwidth)];
}

export interface InvertingValues {
  /** Ω, source resistance included. */
  input: number;
  rf: number;
  /** F; 0 where coupled at DC. */
  cin: number;
}

/**
 * Source to op-amp output, inverting. The input branch is Y = sC/(1 + sC·Ri) (or 1/Ri), and σ·o = −m gives
 * H = −Y/[gF + σ(Y + gF)].
 */
export function invertingTransfer({ input, rf, cin }: InvertingValues, opAmp: OpAmp): Transfer {
  const sigma = sigmaOf(opAmp);
  const branch = cin > 0 ? [0, cin] : [1];
  const feedback = cin > 0 ? [1 / rf, (cin * input) / rf] : [input / rf];
  return {
    numerator: multiply([-1], branch),
    denominator: add(feedback, multiply(sigma, add(branch, feedback))),
  };
}

export interface NonInvertingValues {
  ri: number;
  rf: number;
  /** Ω from the + input to ground; 0 where none is fitted. */
  rb: number;
  cin: number;
  sourceResistance: number;
}

/** Source to op-amp output, not inverting: the coupling network to the + input, then K/(1 + Kσ) with K = 1 + RF/Ri. */
export function nonInvertingTransfer(values: NonInvertingValues, opAmp: OpAmp): Transfer {
  const { ri, rf, rb, cin, sourceResistance: rs } = values;
  const gain = 1 + rf / ri;
  const amplifier = { numerator: [gain], denominator: add([1], multiply([gain], sigmaOf(opAmp))) };
  if (rb === 0) return amplifier;
  return cin > 0
    ? cascade(amplifier, { numerator: [0, cin * rb], denominator: [1, cin * (rb + rs)] })
    : cascade(amplifier, { numerator: [rb], denominator: [rb + rs] });
}

export interface Jack {
  ro: number;
  /** F in series behind it; 0 where coupled at DC. */
  cout: number;
  /** S to ground at the jack. */
  load: number;
  /** F to ground at the jack. */
  cable: number;
}

/** Op-amp output to jack: with Y = gL + sCc it is 1/(1 + Ro·Y), or sCo/(sCo + (1 + sRoCo)Y) with a coupling capacitor. */
export function jackTransfer({ ro, cout, load, cable }: Jack): Transfer {
  if (load === 0 && cable === 0) return { numerator: [1], denominator: [1] };
  if (cout === 0) return { numerator: [1], denominator: [1 + ro * load, ro * cable] };
  return { numerator: [0, cout], denominator: add([0, cout], multiply([1, ro * cout], [load, cable])) };
}
