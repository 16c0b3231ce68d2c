import { minus, plus, reciprocal, times, type Complex } from "../../network/complex.ts";
import type { Transfer } from "../../network/transfer.ts";

/** 1/(1 + s/ω_c): the band limit of the source, Hz. */
export const onePole = (corner: number): Transfer => ({
  numerator: [1],
  denominator: [1, 1 / (2 * Math.PI * corner)],
});

/** H0·(s/Qω0)/(1 + s/Qω0 + (s/ω0)²): the band-pass behind the source. */
export function bandPassTransfer(centre: number, quality: number, gain: number): Transfer {
  const omega = 2 * Math.PI * centre;
  return { numerator: [0, gain / quality / omega], denominator: [1, 1 / quality / omega, 1 / omega / omega] };
}

/**
 * An inverting amplifier whose input resistor stands behind a capacitor. With the op amp's 1/A = s/ω_t,
 * H = −s·C·R_F/(1 + s·C·R + (s/ω_t)(1 + s·C·(R + R_F))).
 *
 * @param gainBandwidth Hz; null for an ideal op amp
 */
export function coupledAmplifier(
  input: number,
  feedback: number,
  coupling: number,
  gainBandwidth: number | null,
): Transfer {
  const lag = gainBandwidth === null ? 0 : 1 / (2 * Math.PI * gainBandwidth);
  return {
    numerator: [0, -coupling * feedback],
    denominator: [1, coupling * input + lag, lag * coupling * (input + feedback)],
  };
}

/** An inverting amplifier coupled at DC: H = −R_F/(R + (s/ω_t)(R + R_F)). */
export function amplifier(input: number, feedback: number, gainBandwidth: number | null): Transfer {
  const lag = gainBandwidth === null ? 0 : 1 / (2 * Math.PI * gainBandwidth);
  return { numerator: [-feedback / input], denominator: [1, lag * (1 + feedback / input)] };
}

/** White density that has this RMS behind one pole: e = V/√(π·f_c/2), V/√Hz. */
export const densityOf = (rms: number, corner: number): number => rms / Math.sqrt((Math.PI / 2) * corner);

/** This near to critical damping the two poles are moved apart: the closed form below divides by their distance. */
const critical = 1e-5;

/**
 * Relative variance of the mean square of band-passed white noise over a window: for Gaussian noise of autocorrelation ρ,
 * (4/T)·∫₀ᵀ (1 − τ/T)·ρ(τ)² dτ. Behind a second-order band-pass with the poles p and q,
 * ρ = (p·e^(pτ) − q·e^(qτ))/(p − q), and each term of its square integrates to a closed form.
 *
 * @param window s
 */
export function powerVariance(centre: number, quality: number, window: number): number {
  const omega = 2 * Math.PI * centre;
  const used = Math.abs(2 * quality - 1) < critical ? 0.5 * (1 + critical) : quality;
  const decay = omega / (2 * used);
  const squared = omega * omega - decay * decay;
  const root = Math.sqrt(Math.abs(squared));
  const [p, q]: readonly [Complex, Complex] =
    squared > 0
      ? [
          { re: -decay, im: root },
          { re: -decay, im: -root },
        ]
      : [
          // Of two real poles the slow one is the difference of near figures; their product is ω0².
          { re: -(omega * omega) / (decay + root), im: 0 },
          { re: -(decay + root), im: 0 },
        ];
  const term = (factor: Complex, rate: Complex) => times(factor, windowed(rate, window));
  const sum = plus(
    minus(term(times(p, p), plus(p, p)), times({ re: 2, im: 0 }, term(times(p, q), plus(p, q)))),
    term(times(q, q), plus(q, q)),
  );
  const apart = minus(p, q);
  return (4 / window) * times(sum, reciprocal(times(apart, apart))).re;
}

/** Below this the exponential's series is shorter than what cancels in the closed form. */
const short = 1e-2;

/** ∫₀ᵀ (1 − τ/T)·e^(rτ) dτ = −1/r + (e^(rT) − 1)/(r²T); T·(½ + rT/6 + (rT)²/24 + …) where |rT| is small. */
function windowed(rate: Complex, window: number): Complex {
  const z = times(rate, { re: window, im: 0 });
  if (Math.hypot(z.re, z.im) < short) {
    let [sum, power]: [Complex, Complex] = [
      { re: 0, im: 0 },
      { re: 0.5, im: 0 },
    ];
    for (let n = 3; n < 12; n++) {
      sum = plus(sum, power);
      power = times(power, { re: z.re / n, im: z.im / n });
    }
    return { re: sum.re * window, im: sum.im * window };
  }
  const size = Math.exp(z.re);
  const grown = { re: size * Math.cos(z.im) - 1, im: size * Math.sin(z.im) };
  const over = reciprocal(rate);
  const part = times(grown, times(over, over));
  return { re: part.re / window - over.re, im: part.im / window - over.im };
}

/** Relative spread of an RMS reading in the trade's rule for long windows, 1/(2·√(B·T)), B the statistical bandwidth. */
export const spreadRule = (statisticalBandwidth: number, window: number): number =>
  1 / (2 * Math.sqrt(statisticalBandwidth * window));

/** A sine-calibrated meter that rectifies and averages reads π/(2·√2) of the mean size: √π/2 of a Gaussian's RMS. */
export const averagingMeter = Math.sqrt(Math.PI) / 2;
