import { GeometryError } from '../../projection/geometry-error';
import { requireFinite } from '../../projection/requirements';

/*
 * The law of propagation of uncertainty for uncorrelated inputs (JCGM 100:2008, GUM, 5.1.2, equation 10):
 *
 *     u(y)² = Σ (∂f/∂x_i)² u(x_i)²,
 *
 * with each derivative taken as the change over x_i ± u(x_i) (GUM 5.1.3, note 2), which also follows a gentle curve. It holds while
 * f is nearly straight over a few u; where an input's uncertainty nears the input itself, the result is only a warning.
 */

/** A figure and its standard uncertainty (one standard deviation), in the same unit. */
export interface Measured {
  readonly value: number;
  readonly uncertainty: number;
}

export const measured = (value: number, uncertainty: number): Measured => ({ value, uncertainty });

/** What each input adds to the uncertainty of the result: half the change of f over x_i ± u_i, with its sign. */
export function contributions(f: (inputs: number[]) => number, inputs: readonly Measured[]): number[] {
  const values = inputs.map(({ value }) => value);
  return inputs.map(({ value, uncertainty }, i) => {
    if (!(uncertainty >= 0)) {
      throw new GeometryError('uncertainty', `An uncertainty is zero or more, but is ${uncertainty}.`);
    }
    const at = (x: number) => f(values.with(i, x));
    return uncertainty === 0 ? 0 : (at(value + uncertainty) - at(value - uncertainty)) / 2;
  });
}

/**
 * A result with its standard uncertainty.
 * @throws GeometryError for an uncertainty below zero, and whatever f throws for impossible inputs.
 */
export function propagate(f: (inputs: number[]) => number, inputs: readonly Measured[]): Measured {
  const value = f(inputs.map((input) => input.value));
  requireFinite('value', value);
  return { value, uncertainty: Math.hypot(...contributions(f, inputs)) };
}

/** The mean of readings of one thing, and the standard uncertainty of that mean (GUM 4.2.3): s/√n. At least two readings. */
export function meanOf(readings: readonly number[]): Measured {
  const n = readings.length;
  if (n < 2) throw new GeometryError('readings', `A mean with an uncertainty needs two readings or more, but there are ${n}.`);
  const value = readings.reduce((sum, x) => sum + x, 0) / n;
  const variance = readings.reduce((sum, x) => sum + (x - value) ** 2, 0) / (n - 1);
  return { value, uncertainty: Math.sqrt(variance / n) };
}

/**
 * The mean of readings that follow each other closely, with the spread s of a single one: what disturbs one disturbs its neighbours too
 * (sway, a tracker's smoothing), so that their number makes the mean no surer (GUM 4.2.7). At least two readings.
 */
export function steadyMeanOf(readings: readonly number[]): Measured {
  const { value, uncertainty } = meanOf(readings);
  return { value, uncertainty: uncertainty * Math.sqrt(readings.length) };
}
